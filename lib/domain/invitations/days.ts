/** Days from the sending of an invitation to its end. */
export const invitationDays = 7;
