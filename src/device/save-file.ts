/** Ways out of the tablet, best first: a chosen place, the share sheet, the download folder. */
export type FileRoute = 'picker' | 'share' | 'download';

/**
 * Saved: written and closed. Shared: handed to another app. Downloaded: given to the browser, which says nothing more.
 * Tap again: the browser wants a fresh tap, because the file took too long to make.
 */
export type FileOutcome = 'saved' | 'shared' | 'downloaded' | 'cancelled' | 'tap again' | 'failed';

interface WritableFile {
  write(data: Blob): Promise<void>;
  close(): Promise<void>;
}

export interface SaveFileWindow {
  readonly document: Pick<Document, 'createElement'>;
  readonly navigator: {
    readonly standalone?: boolean;
    canShare?(data: { files: File[] }): boolean;
    share?(data: { files: File[]; title: string }): Promise<void>;
  };
  readonly URL: { createObjectURL(blob: Blob): string; revokeObjectURL(url: string): void };
  showSaveFilePicker?(options: { suggestedName: string }): Promise<{ createWritable(): Promise<WritableFile> }>;
  setTimeout(handler: () => void, ms: number): unknown;
}

/** The routes that this browser has for this file, best first; the others can be offered after "cancelled". */
export function fileRoutes(file: File, window: SaveFileWindow = globalThis.window): FileRoute[] {
  const { navigator } = window;
  const routes: FileRoute[] = [];
  if (window.showSaveFilePicker !== undefined) routes.push('picker');
  if (navigator.share !== undefined && navigator.canShare?.({ files: [file] }) === true) routes.push('share');
  // An app on an iPad's home screen opens a download in a viewer that has no way back.
  if (navigator.standalone !== true || routes.length === 0) routes.push('download');
  return routes;
}

/**
 * Takes a file that is made already: the picker and the share sheet open only within about 5 s of the tap.
 * Call it from the tap itself.
 */
export async function saveFile(
  file: File,
  route: FileRoute,
  window: SaveFileWindow = globalThis.window,
): Promise<FileOutcome> {
  try {
    switch (route) {
      case 'picker': {
        const handle = await window.showSaveFilePicker?.({ suggestedName: file.name });
        if (handle === undefined) return 'failed';
        const writable = await handle.createWritable();
        await writable.write(file);
        await writable.close();
        return 'saved';
      }
      case 'share':
        if (window.navigator.share === undefined) return 'failed';
        await window.navigator.share({ files: [file], title: file.name });
        return 'shared';
      case 'download':
        download(file, window);
        return 'downloaded';
    }
  } catch (error) {
    return outcomeOf(error);
  }
}

function download(file: File, window: SaveFileWindow): void {
  const url = window.URL.createObjectURL(file);
  const link = window.document.createElement('a');
  link.href = url;
  link.download = file.name;
  link.click();
  // A large file is read after the click returned.
  window.setTimeout(() => window.URL.revokeObjectURL(url), 60_000);
}

function outcomeOf(error: unknown): FileOutcome {
  const name = error instanceof Error || error instanceof DOMException ? error.name : '';
  if (name === 'AbortError') return 'cancelled';
  return name === 'NotAllowedError' || name === 'SecurityError' ? 'tap again' : 'failed';
}
