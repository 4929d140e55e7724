import { z } from 'zod';

/** Mails a person may do without; what is about access and accounts always comes. */
export const mailPreferencesSchema = z.strictObject({
  'study-failed': z.boolean().meta({ description: 'A study that one made or sent files to is assessed with a fail.' }),
});
export type MailPreferences = z.infer<typeof mailPreferencesSchema>;
export type OptionalMailKind = keyof MailPreferences;

/** What holds until a person chooses. */
export const usualMailPreferences: MailPreferences = { 'study-failed': true };
