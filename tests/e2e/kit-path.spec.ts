import { expect, test, type Page } from "@playwright/test";
import { signInAs } from "./sign-in";

test.describe.configure({ mode: "serial" });

/** One kit, from its bench to the customer, each step by the person whose work it is. */
let runCode = "";
let serial = "";

test("a manager starts a run from the kit's bench", async ({ page }) => {
  await signInAs(page, "manager");
  await page.goto("/staff/kits");
  await page.getByRole("row", { name: /Plain Weld/ }).getByRole("link").click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Heron Steps, Plain Weld");
  await page.getByLabel("Make kits").fill("999999");
  await page.getByRole("button", { name: "Reserve fabric" }).click();
  await expect(page.getByRole("alert").filter({ hasText: /at most 500|A run has/ })).toBeVisible();
  await page.getByLabel("Make kits").fill("400");
  await page.getByRole("button", { name: "Reserve fabric" }).click();
  await expect(page.getByText(/400 kits were asked for; the bolts allow/)).toBeVisible();
  await expect(page.getByLabel("Make kits")).toHaveValue("400");
  await page.getByLabel("Make kits").fill("1");
  await page.getByRole("button", { name: "Reserve fabric" }).click();
  await page.waitForURL(/\/staff\/runs\/N/);
  runCode = new URL(page.url()).pathname.split("/").at(-1) ?? "";
  serial = (await page.getByRole("table", { name: "Kits of the run" }).getByRole("cell").nth(0).textContent()) ?? "";
  expect(serial).toMatch(/^K\d{4}/);
});

test("a cutter cuts every length by scan, and a wrong bolt is refused", async ({ page }) => {
  await signInAs(page, "cutter");
  await page.goto(`/table/${runCode}`);
  await scan(page, "B9999X");
  await expect(page.getByRole("alert").filter({ hasText: "That tag is not on this run" })).toBeVisible();
  await expect(page.getByRole("button", { name: /^Cut for bag/ })).toBeDisabled();
  for (let length = 1; length <= 3; length += 1) {
    const tag = /tag (B\w+\*?),/.exec((await page.getByText(/^Shelf/).textContent()) ?? "")?.[1] ?? "";
    await scan(page, tag);
    await page.getByRole("button", { name: /^Cut for bag/ }).click();
    await expect(page.getByText(`${length} of 3 cut`)).toBeVisible();
  }
  await expect(page.getByText("Every length of this run is cut.")).toBeVisible();
  // The table shows a cut as soon as it is kept; the book has it once nothing waits.
  await expect(page.getByText("nothing waits to be sent")).toBeVisible();
  await page.goto(`/staff/runs/${runCode}`);
  await expect(page.getByRole("table", { name: "Lengths in cutting order" }).getByRole("cell", { name: "cut", exact: true })).toHaveCount(3);
});

test("a packer packs the kit by scan and gets its label", async ({ page }) => {
  await signInAs(page, "packer");
  await page.goto("/staff/packing");
  await scanInto(page, serial);
  await page.getByRole("button", { name: "Close the bag" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "Still missing" })).toBeVisible();
  const tags = await page.getByRole("table", { name: "What goes into the bag" }).getByRole("cell").filter({ hasText: /^C\d{4}/ }).allTextContents();
  expect(tags).toHaveLength(3);
  for (const tag of tags) await scanInto(page, tag);
  await scanInto(page, tags[0] ?? "");
  await expect(page.getByRole("alert").filter({ hasText: "in the bag already" })).toBeVisible();
  await scanInto(page, "N-101");
  await expect(page.getByText("Everything is in.")).toBeVisible();
  await page.getByRole("button", { name: "Close the bag" }).click();
  await expect(page.getByText(`Kit ${serial} is packed.`)).toBeVisible();
});

test("the counter opens a till and sells the kit and 2 3/8 yd for cash with a receipt", async ({ page }) => {
  await signInAs(page, "counter");
  await page.goto("/staff/bolts?text=Turnpike");
  const bolt = (await page.getByRole("cell").filter({ hasText: /^B\d{4}/ }).first().textContent()) ?? "";
  await page.goto("/counter");
  await page.getByLabel("Float in the drawer").fill("100.00");
  await page.getByRole("button", { name: "Open the till" }).click();
  await find(page, serial);
  await expect(page.getByRole("rowheader", { name: /Heron Steps kit, Plain Weld/ })).toBeVisible();
  await find(page, bolt);
  await page.getByLabel("Length to cut").fill("2 3/8");
  await page.getByRole("button", { name: "Add to basket" }).click();
  // 2 3/8 yd at 14.60 is 34.68; with the kit at 56.00 and 6.5 % on each line 96.57.
  await page.getByLabel("Cash given").fill("50.00");
  await page.getByRole("button", { name: "Take payment" }).click();
  await expect(page.getByRole("alert").filter({ hasText: "$96.57 are due" })).toBeVisible();
  await page.getByLabel("Cash given").fill("100.00");
  await page.getByRole("button", { name: "Take payment" }).click();
  await expect(page.getByText("$3.43")).toBeVisible();
  const receipt = await page.request.get((await page.getByRole("link", { name: "Open the receipt" }).getAttribute("href")) ?? "");
  expect(receipt.headers()["content-type"]).toBe("application/pdf");
  expect((await receipt.body()).subarray(0, 5).toString()).toBe("%PDF-");
  await find(page, serial);
  await expect(page.getByRole("alert").filter({ hasText: "sold already" })).toBeVisible();
});

async function scan(page: Page, tag: string): Promise<void> {
  await page.getByLabel("Scan the bolt").fill(tag);
  await page.getByLabel("Scan the bolt").press("Enter");
}

async function scanInto(page: Page, text: string): Promise<void> {
  const field = page.getByLabel(/^Scan (into bag|the tag on the bag)/);
  await field.fill(text);
  const answered = page.waitForResponse(/\/api\/kits\//);
  await field.press("Enter");
  await answered;
}

async function find(page: Page, text: string): Promise<void> {
  await page.getByLabel("Scan a bolt, a kit or a notion").fill(text);
  await page.getByLabel("Scan a bolt, a kit or a notion").press("Enter");
}
