/* Functions that run in the page: each stands alone. */

/** Texts that are cut, that stick out of the window, or a page that scrolls on into nothing. */
export function cutTexts(): string[] {
  const cut: string[] = [];
  const { documentElement: root, body } = document;
  if (root.scrollWidth > window.innerWidth) cut.push(`the page is ${root.scrollWidth} px wide`);
  const bottom = Math.max(body.getBoundingClientRect().bottom + window.scrollY, window.innerHeight);
  if (root.scrollHeight > bottom + 1) cut.push(`the page scrolls ${root.scrollHeight - Math.round(bottom)} px too far`);

  /** Placed out of sight, for who hears the page. */
  const isOnlyHeard = (element: Element): boolean => {
    for (let frame: Element | null = element; frame !== null; frame = frame.parentElement) {
      if (frame.clientWidth === 1 && getComputedStyle(frame).position === 'absolute') return true;
    }
    return false;
  };
  const modal = [...document.querySelectorAll('dialog')].findLast((dialog) => dialog.matches(':modal'));
  const walker = document.createTreeWalker(modal ?? body, NodeFilter.SHOW_TEXT);
  for (let node = walker.nextNode(); node !== null; node = walker.nextNode()) {
    const text = node.textContent?.trim() ?? '';
    const parent = node.parentElement;
    if (text === '' || parent === null || !parent.checkVisibility({ visibilityProperty: true })) continue;
    if (parent.closest('style, script, noscript') !== null || isOnlyHeard(parent)) continue;
    const range = document.createRange();
    range.selectNodeContents(node);
    for (const box of range.getClientRects()) {
      if (box.width === 0) continue;
      const say = (how: string) => cut.push(`"${text.slice(0, 40)}" ${how}`);
      if (box.left < -1 || box.right > window.innerWidth + 1) say('sticks out of the window');
      const control = parent.closest('button, a, label')?.getBoundingClientRect();
      // A link in a text has the height of its letters.
      const above = box.height / 3;
      if (control !== undefined && (box.bottom > control.bottom + above || box.top < control.top - above)) {
        say('sticks out of its control');
      }
      for (let frame: Element | null = parent; frame !== null && frame !== body; frame = frame.parentElement) {
        const { display, overflowX, overflowY, position } = getComputedStyle(frame);
        if (display === 'contents') continue;
        const bounds = frame.getBoundingClientRect();
        if (overflowX !== 'visible' && (box.left < bounds.left - 1 || box.right > bounds.right + 1)) {
          say(`is cut at the side by <${frame.tagName.toLowerCase()} class="${frame.getAttribute('class') ?? ''}">`);
        }
        const clips = overflowY === 'hidden' || overflowY === 'clip';
        // Lines are taller than their letters; a third of a line is empty.
        const slack = frame === parent ? box.height / 3 : 1;
        if (clips && (box.top < bounds.top - slack || box.bottom > bounds.bottom + slack)) {
          say(`is cut above or below by <${frame.tagName.toLowerCase()} class="${frame.getAttribute('class') ?? ''}">`);
        }
        if (position === 'fixed') break;
      }
    }
  }
  return [...new Set(cut)];
}

/** Labels of one drawing that lie on each other. */
export function overlappingLabels(): string[] {
  const found: string[] = [];
  for (const drawing of document.querySelectorAll('svg')) {
    const labels = [...drawing.querySelectorAll('text')].filter((label) => label.checkVisibility());
    labels.forEach((label, index) => {
      const a = label.getBoundingClientRect();
      for (const other of labels.slice(index + 1)) {
        const b = other.getBoundingClientRect();
        const wide = Math.min(a.right, b.right) - Math.max(a.left, b.left);
        const high = Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top);
        // Boxes of lines one below the other share their empty edges.
        if (wide > 1 && high > Math.min(a.height, b.height) * 0.45) {
          found.push(`"${label.textContent ?? ''}" lies on "${other.textContent ?? ''}"`);
        }
      }
    });
  }
  return found;
}

/** What a finger can act on and is smaller than so many px; links in the middle of a text are let be. */
export function smallTargets(leastPx: number): string[] {
  const modal = [...document.querySelectorAll('dialog')].findLast((dialog) => dialog.matches(':modal'));
  const selector = 'a[href], button, input, select, textarea, summary, [tabindex="0"]';
  const small: string[] = [];
  for (const element of (modal ?? document).querySelectorAll<HTMLElement>(selector)) {
    const isChoice = element instanceof HTMLInputElement && ['radio', 'checkbox'].includes(element.type);
    const target = isChoice ? (element.closest('label') ?? element) : element;
    if (!target.checkVisibility({ visibilityProperty: true })) continue;
    // A frame that takes the focus so that keys can scroll it is no target.
    if (element.matches('main, nav, div')) continue;
    const { width, height } = target.getBoundingClientRect();
    const inText = getComputedStyle(target).display === 'inline' && target.closest('p') !== null;
    if (inText || (width >= leastPx - 0.5 && height >= leastPx - 0.5)) continue;
    const name = element.getAttribute('aria-label') ?? target.textContent?.trim().slice(0, 30) ?? '';
    small.push(`${element.tagName.toLowerCase()} "${name}" is ${Math.round(width)} x ${Math.round(height)} px`);
  }
  return small;
}
