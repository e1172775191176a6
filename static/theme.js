/* global document, localStorage */
// Before the first paint, so that no light page flashes in a dark room. Kept by src/device/theme.ts.
document.documentElement.dataset.theme = localStorage.getItem('lintfree-theme') ?? 'light';
