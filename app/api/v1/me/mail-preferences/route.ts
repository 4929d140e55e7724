import { route } from '@/app/_server/route';
import { getMailPreferencesContract, updateMailPreferencesContract } from '@/lib/domain/people/account-schema';
import { getMailPreferences } from '@/lib/services/account/get-mail-preferences';
import { updateMailPreferences } from '@/lib/services/account/update-mail-preferences';

export const GET = route(getMailPreferencesContract, ({ ctx }) => getMailPreferences(ctx));
export const PATCH = route(updateMailPreferencesContract, ({ ctx, body }) => updateMailPreferences(ctx, body));
