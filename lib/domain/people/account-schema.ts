import { z } from 'zod';
import { contract } from '../api/contract';
import { mailPreferencesSchema } from '../mail/preferences';
import { emailSchema, passwordSchema } from './schema';

export const requestResetSchema = z.strictObject({ email: emailSchema });
export const confirmResetSchema = z.strictObject({ token: z.string().min(1).max(100), password: passwordSchema });
export type ConfirmResetInput = z.infer<typeof confirmResetSchema>;
export const changePasswordSchema = z.strictObject({ password: z.string().min(1, 'Type the present password.').max(200), newPassword: passwordSchema });
export type ChangePasswordInput = z.infer<typeof changePasswordSchema>;

export const requestResetContract = contract({
  method: 'POST', path: '/password-resets', summary: 'Ask for a link that sets a new password', access: 'public', status: 202,
  body: requestResetSchema, response: requestResetSchema.meta({ description: 'The same whether or not the address has an account.' }), secret: true,
});
export const confirmResetContract = contract({
  method: 'POST', path: '/password-resets/confirm', summary: 'Set a new password by a link', access: 'public', status: 204,
  body: confirmResetSchema, secret: true, alsoRefuses: [404],
});
export const changePasswordContract = contract({
  method: 'POST', path: '/me/password', summary: 'Change the own password', access: 'signed-in', status: 204, body: changePasswordSchema,
  secret: true, alsoRefuses: [429],
});
export const getMailPreferencesContract = contract({
  method: 'GET', path: '/me/mail-preferences', summary: 'Which mails one wants', access: 'signed-in', status: 200, response: mailPreferencesSchema,
  alsoRefuses: [403],
});
export const updateMailPreferencesContract = contract({
  method: 'PATCH', path: '/me/mail-preferences', summary: 'Choose which mails one wants', access: 'signed-in', status: 200,
  body: mailPreferencesSchema.partial(), response: mailPreferencesSchema,
});
