import type { Line } from '../core/event/entry.ts';
import { fileRoutes, saveFile } from '../device/save-file.ts';

/** Offers lines that could not be saved as a file, so that they can be brought back later. */
export async function keepUnsaved(lines: readonly Line[]): Promise<void> {
  const file = new File([lines.map(({ text }) => `${text}\n`).join('')], 'lintfree-not-saved.jsonl', {
    type: 'application/x-ndjson',
  });
  const [route] = fileRoutes(file);
  if (route) await saveFile(file, route);
}
