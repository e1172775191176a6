import { Refusal } from './say.mjs';

/** The oldest Node that the installed packages run on. */
const oldest = /** @type {const} */ ([20, 19]);

/** @param {string} version as in `process.versions.node` */
export function refuseOldNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  if (major > oldest[0] || (major === oldest[0] && minor >= oldest[1])) return;
  throw new Refusal(`Lintfree needs Node ${oldest.join('.')} or newer; this is Node ${version}.`);
}
