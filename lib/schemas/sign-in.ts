import { z } from 'zod';

export const signInInput = z.object({
  email: z
    .string()
    .trim()
    .toLowerCase()
    .min(3, 'Write your e-mail address.')
    .max(200, 'This address is too long.'),
  password: z.string().min(1, 'Write your password.').max(200, 'This password is too long.'),
});
