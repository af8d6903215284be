/** Forms of having an account. The sentences are what a person reads at the field. */
import { z } from 'astro/zod';

const email = z.string({ required_error: 'The address is missing. Write it like name@saltmarsh.example.' }).trim().min(1, 'The address is missing. Write it like name@saltmarsh.example.').max(254, 'At most 254 characters work here.');

export const SignInForm = z.object({
  email,
  password: z.string({ required_error: 'The password is missing.' }).min(1, 'The password is missing.').max(1_024),
  to: z.string().optional(),
});
export type SignInInput = z.output<typeof SignInForm>;
