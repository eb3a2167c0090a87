import { expect, type Page } from "@playwright/test";
import type { RoleName } from "@/lib/core/policy/policy";
import { DEMO_PASSWORD, DEMO_PEOPLE } from "@/seeders/demo-people";

/**
 * Signs the page's browser in as the demo's person of a role, without filling in the form: that form has a test of its
 * own, and every other test starts where the work starts.
 */
export async function signInAs(page: Page, role: RoleName): Promise<void> {
  const person = DEMO_PEOPLE.find((each) => each.roles.includes(role));
  if (!person) throw new Error(`The demo has nobody who is ${role}.`);
  const { csrfToken } = (await (await page.request.get("/api/auth/csrf")).json()) as { csrfToken: string };
  const form = { csrfToken, email: person.email, password: DEMO_PASSWORD, json: "true", callbackUrl: "/" };
  const answer = await page.request.post("/api/auth/callback/credentials", { form });
  expect(answer.ok(), `${person.email} is let in`).toBe(true);
}
