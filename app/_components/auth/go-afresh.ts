/** Goes to an address by loading it anew, so that nothing read for somebody else stays in memory. */
export function goAfresh(address: string): void {
  window.location.assign(address);
}
