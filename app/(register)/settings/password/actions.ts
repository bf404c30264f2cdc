'use server';

import { routes } from '@/lib/routes';
import { action } from '@/lib/server/action';
import { changePassword } from '@/lib/server/commands/change-password';

export const changePasswordAction = action(changePassword, () => routes.signIn());
