/** Days from the sending of an invitation to its end. */
export const invitationDays = 7;

/** When an invitation sent at a moment ends. */
export function invitationEnd(sentAt: Date): Date {
  return new Date(sentAt.getTime() + invitationDays * 24 * 3600_000);
}
