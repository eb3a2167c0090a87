import AxeBuilder from "@axe-core/playwright";
import { expect, test } from "@playwright/test";
import { signInAs } from "./sign-in";

for (const address of ["/staff", "/staff/blocks", "/staff/blocks/clays-choice", "/staff/kits", "/staff/kits/weir-pool", "/staff/bolts", "/staff/runs", "/staff/find?q=heron", "/staff/packing", "/table", "/counter", "/staff/design"]) {
  test(`axe finds nothing on ${address}`, async ({ page }) => {
    await signInAs(page, "owner");
    await page.goto(address);
    await page.waitForLoadState("networkidle");
    const { violations } = await new AxeBuilder({ page }).withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"]).analyze();
    expect(violations.map((violation) => `${violation.id}: ${violation.nodes.map((node) => node.target.join(" ")).join("; ")}`)).toEqual([]);
  });
}

test("a stranger is sent to sign in, and a cutter is refused the counter", async ({ page }) => {
  await page.goto("/staff/bolts");
  await expect(page).toHaveURL(/\/sign-in\?next=/);
  await page.getByLabel("E-mail").fill("tobias@osierfalls.example");
  await page.getByLabel("Password").fill("not this one");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "do not go together" })).toBeVisible();
  await expect(page.getByLabel("E-mail")).toHaveValue("tobias@osierfalls.example");
  await page.getByLabel("Password").fill("clothroom-demo");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Bolts");
  const answer = await page.goto("/counter");
  expect(answer?.status()).toBe(403);
});
