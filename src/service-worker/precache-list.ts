export interface BuildLists {
  /** Folder of the app, without a slash at its end. */
  readonly base: string;
  /** Files whose names carry a hash of their content. */
  readonly build: readonly string[];
  /** Files whose names stay the same from version to version. */
  readonly files: readonly string[];
  readonly prerendered: readonly string[];
  readonly version: string;
}

export interface PrecacheEntry {
  readonly url: string;
  /** Null where the name is the revision. */
  readonly revision: string | null;
}

/**
 * Everything that the app may ever ask for. The page itself stands in no list of the framework's while routes live
 * behind `#`, so it is added here.
 */
export function precacheList(lists: BuildLists): PrecacheEntry[] {
  // Every browser that runs this worker takes woff2; the older twins would only be carried along.
  const hashed = lists.build.filter((url) => !url.endsWith('.woff'));
  // The page names the hashed files, so it is new whenever one of them is, whatever the version says.
  const revision = `${lists.version}-${fingerprint(hashed.join('\n'))}`;
  const named = new Set([`${lists.base}/`, ...lists.files, ...lists.prerendered]);
  return [...hashed.map((url) => ({ url, revision: null })), ...[...named].map((url) => ({ url, revision }))];
}

/** FNV-1a, 32 bits: tells builds apart, proves nothing. */
export function fingerprint(text: string): string {
  let hash = 0x811c9dc5;
  for (let index = 0; index < text.length; index += 1) {
    hash = Math.imul(hash ^ text.charCodeAt(index), 0x01000193);
  }
  return (hash >>> 0).toString(16).padStart(8, '0');
}
