import type { Locator } from 'playwright-core';

export interface DroppedFile { name: string; bytes: Buffer }

/** Drops files onto a part of the page, as from a folder on the desktop. */
export async function dropFiles(target: Locator, files: readonly DroppedFile[]): Promise<void> {
  const plain = files.map(({ name, bytes }) => ({ name, base64: bytes.toString('base64') }));
  const dataTransfer = await target.page().evaluateHandle((given) => {
    const transfer = new DataTransfer();
    for (const { name, base64 } of given) transfer.items.add(new File([Uint8Array.from(atob(base64), (sign) => sign.charCodeAt(0))], name));
    return transfer;
  }, plain);
  await target.dispatchEvent('dragover', { dataTransfer });
  await target.dispatchEvent('drop', { dataTransfer });
}
