/** What tells a file from another one of the same name and size: enough to go on with an upload after the page was left. */
const edge = 1024 * 1024;
const keyOf = (upload: string) => `fourfold-upload-${upload}`;

async function fingerprint(file: File): Promise<string | null> {
  // Digests exist on safe origins only; without one an upload is begun anew rather than mixed from two files.
  if (typeof crypto.subtle === 'undefined') return null;
  const edges = new Blob([file.slice(0, edge), file.slice(Math.max(0, file.size - edge))]);
  const digest = await crypto.subtle.digest('SHA-256', await edges.arrayBuffer());
  const hex = [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('');
  return `${file.name} ${file.size} ${file.lastModified} ${hex}`;
}

/** Remembers which file an upload sends. */
export async function rememberUpload(upload: string, file: File): Promise<void> {
  const print = await fingerprint(file);
  try {
    if (print !== null) localStorage.setItem(keyOf(upload), print);
  } catch {
    // A browser without storage begins anew after a reload; nothing else is lost.
  }
}

export function forgetUpload(upload: string): void {
  try {
    localStorage.removeItem(keyOf(upload));
  } catch {
    // As above.
  }
}

/** Whether an upload that was half sent before is of this very file. */
export async function isRemembered(upload: string, file: File): Promise<boolean> {
  try {
    const kept = localStorage.getItem(keyOf(upload));
    return kept !== null && kept === (await fingerprint(file));
  } catch {
    return false;
  }
}
