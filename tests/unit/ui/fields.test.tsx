import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { Button } from "@/components/ui/button";
import { Checkbox, RadioRow } from "@/components/ui/choices";
import { InchField } from "@/components/ui/inch-field";
import { LengthField } from "@/components/ui/length-field";
import { MoneyField } from "@/components/ui/money-field";
import { Select, TextInput } from "@/components/ui/text-input";
import { centimetres, inches, yards } from "@/lib/core/measure/length";

/** Every id that a control leans on is there, and the label names the control. */
function expectWired(markup: string): void {
  const ids = new Set([...markup.matchAll(/ id="([^"]+)"/g)].map((match) => match[1]));
  const used = [...markup.matchAll(/ (?:for|aria-describedby)="([^"]+)"/g)].flatMap((match) => (match[1] ?? "").split(" "));
  expect(used.length).toBeGreaterThan(0);
  for (const id of used) expect(ids).toContain(id);
}

describe("fields", () => {
  it("wires label, hint and error to the control", () => {
    const markup = renderToStaticMarkup(<TextInput id="price" label="Price a yard" hint="As on the bolt." error="“x” is not an amount. Wanted: 12.40." />);
    expectWired(markup);
    expect(markup).toContain('aria-describedby="price-error price-hint"');
    expect(markup).toContain('aria-invalid="true"');
    expect(markup).toContain('role="alert"');
  });

  it("names nothing that is not there", () => {
    const markup = renderToStaticMarkup(<TextInput id="shelf" label="Shelf" />);
    expect(markup).not.toContain("aria-describedby");
    expect(markup).not.toContain("aria-invalid");
  });

  it("wires the other controls", () => {
    expectWired(renderToStaticMarkup(<Select label="Mill" hint="Who wove it." options={[{ value: "a", label: "Gannet & Row" }]} />));
    expectWired(renderToStaticMarkup(<Checkbox label="One-way print" hint="A nap counts too." />));
    expectWired(renderToStaticMarkup(<MoneyField label="Price" currency="USD" defaultValue={1240} hint="Before tax." />));
    expectWired(renderToStaticMarkup(<LengthField label="Length" defaultValue={yards(2.375)} />));
    expectWired(renderToStaticMarkup(<LengthField label="Length" error="9 yd is more than the 6 yd that are left." />));
    expectWired(renderToStaticMarkup(<InchField label="Cut size" defaultValue={inches(3.875)} error="Wanted: a size." />));
  });

  it("gives a row of choices one legend, and ticks the one that is chosen", () => {
    const markup = renderToStaticMarkup(<RadioRow legend="Setting" name="setting" defaultValue="b" options={[{ value: "a", label: "Straight" }, { value: "b", label: "On point" }]} />);
    expect(markup).toContain("<legend");
    expect(markup).toMatch(/checked=""[^>]*value="b"|value="b"[^>]*checked=""/);
  });
});

describe("length field", () => {
  it("shows eight keys that read 0 to 7/8, the measured one pressed", () => {
    const markup = renderToStaticMarkup(<LengthField label="Length" name="length" defaultValue={yards(2.375)} />);
    expect(markup.match(/aria-pressed/g)).toHaveLength(8);
    expect(markup.match(/aria-pressed="true"[^>]*><span aria-hidden="true">([^<]*)/)?.[1]).toBe("3\u20448");
    expect(markup).toContain('value="2 3\u20448"');
    expect(markup).toContain(`name="length" value="${yards(2.375)}"`);
    expect(markup).toContain("217 cm");
  });

  it("steps ten centimetres in a metric shop", () => {
    const markup = renderToStaticMarkup(<LengthField label="Length" system="metres" defaultValue={centimetres(240)} />);
    expect(markup.match(/aria-pressed/g)).toHaveLength(10);
    expect(markup.match(/aria-pressed="true"[^>]*><span aria-hidden="true">([^<]*)/)?.[1]).toBe("40");
    expect(markup).toContain('value="2 m 40"');
  });
});

describe("button", () => {
  it("sends no form by accident, and names its key", () => {
    const markup = renderToStaticMarkup(<Button keys="Alt S">Set aside</Button>);
    expect(markup).toContain('type="button"');
    expect(markup).toContain('aria-keyshortcuts="Alt+S"');
    expect(markup).toContain("<kbd>Alt S</kbd>");
  });

  it("keeps its place while work is under way and sends nothing a second time", () => {
    const markup = renderToStaticMarkup(
      <Button type="submit" pending pendingLabel="Reserving">
        Reserve
      </Button>,
    );
    expect(markup).toContain('aria-disabled="true"');
    expect(markup).toContain('type="button"');
    expect(markup).toContain("Reserving");
    expect(markup).not.toContain("disabled=\"\"");
  });
});
