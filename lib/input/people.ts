import { z } from "zod";
import { ROLES } from "../core/policy/policy";

export const requestId = z.uuid("The request has no number of its own; load the page again.");
export const email = z.string().trim().toLowerCase().max(254, "An e-mail address is at most 254 characters.").pipe(z.email("Write an e-mail address, such as ines@example.org."));
const personName = z.string().trim().min(1, "Write a name.").max(120, "A name is at most 120 characters.");
const place = z.string().trim().max(60, "A place is at most 60 characters.").transform((text) => text || null);
const roles = z.preprocess((value) => (value === undefined ? [] : Array.isArray(value) ? value : [value]), z.array(z.enum(ROLES)).max(ROLES.length));
const personId = z.coerce.number().int().positive();

export const inviteInput = z.object({ requestId, name: personName, email, roles, place });
export const changePersonInput = z.object({ requestId, personId, name: personName, roles, place, active: z.coerce.boolean() });
export const personRequest = z.object({ requestId, personId });

export const passwordInput = z
  .object({
    token: z.string().min(10).max(200),
    password: z.string().min(10, "A password has at least 10 characters.").max(200, "A password has at most 200 characters."),
    again: z.string(),
  })
  .refine((value) => value.password === value.again, { path: ["again"], message: "The two passwords differ." });
