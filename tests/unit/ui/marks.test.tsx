import { readdirSync, readFileSync } from "node:fs";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { clothFill, clothRepeat } from "@/components/ui/cloth";
import { ClothPatterns } from "@/components/ui/cloth-patterns";
import { nameThem, totalsOf } from "@/components/ui/data-rows";
import { LoadingTape } from "@/components/ui/loading-tape";
import { Notice } from "@/components/ui/notice";
import { StageDots } from "@/components/ui/selvage-dots";
import { pinked, Swatch } from "@/components/ui/swatch";
import { yards } from "@/lib/core/measure/length";

describe("cloth", () => {
  it("repeats each drawn tile at its own size", () => {
    for (const file of readdirSync("public/fabrics").filter((name) => name.endsWith(".svg"))) {
      const drawn = /width="([\d.]+)" height="([\d.]+)"/.exec(readFileSync(`public/fabrics/${file}`, "utf8"));
      expect([file, ...clothRepeat(`/fabrics/${file}`)]).toEqual([file, Number(drawn?.[1]), Number(drawn?.[2])]);
    }
  });

  it("draws one pattern a fabric, on its colour, under the name that fills ask for", () => {
    const ferry = { id: "12", tile: "/fabrics/ferry.svg", colour: "#23365F" };
    const markup = renderToStaticMarkup(<ClothPatterns fabrics={[ferry, ferry, { id: "13", tile: "", colour: "#7397AC" }]} />);
    expect(markup.match(/<pattern/g)).toHaveLength(2);
    expect(markup).toContain('id="cloth-12"');
    expect(clothFill("12")).toBe("url(#cloth-12)");
    expect(markup.match(/<image/g)).toHaveLength(1);
  });

  it("keeps a strange id inside its url", () => {
    expect(clothFill("a) x")).toBe("url(#cloth-a__x)");
  });

  it("pinks the long edges and keeps the corners square", () => {
    expect(pinked(8, 10)).toBe("M0 2L2 0L4 2L6 0L8 2L8 8L6 10L4 8L2 10L0 8Z");
    expect(renderToStaticMarkup(<Swatch fabric={null} label="no fabric yet" />)).toContain("swatch-blank");
  });
});

describe("marks", () => {
  it("fills a dot a stage and says the word", () => {
    const markup = renderToStaticMarkup(<StageDots stage="cutting" />);
    expect(markup.match(/fill="var\(--walnut\)"/g)).toHaveLength(3);
    expect(markup).toContain("cutting");
    expect(markup).toContain("3 of 5 stages");
  });

  it("interrupts for an error only", () => {
    expect(renderToStaticMarkup(<Notice kind="error" title="No." />)).toContain('role="alert"');
    expect(renderToStaticMarkup(<Notice kind="offline" title="No connection." />)).toContain('role="status"');
  });

  it("draws long work to scale and gives it as a percentage", () => {
    expect(renderToStaticMarkup(<LoadingTape title="Maps" label="Maps" done={8} of={12} />)).toContain('aria-valuenow="67"');
    expect(renderToStaticMarkup(<LoadingTape title="Maps" label="Maps" done={null} of={12} />)).not.toContain("aria-valuenow");
    expect(renderToStaticMarkup(<LoadingTape title="Maps" label="Maps" done={0} of={0} />)).not.toContain("NaN");
  });
});

describe("picked rows", () => {
  it("are named and totalled", () => {
    const row = (name: string, sell: number) => ({ id: name, name, cells: {}, totals: [{ label: "to sell", length: yards(sell) }] });
    expect(totalsOf([row("Kiln", 2.375), row("Wet Slate", 10)])).toEqual([{ label: "to sell", units: yards(12.375) }]);
    expect(nameThem(["a"])).toBe("a");
    expect(nameThem(["a", "b"])).toBe("a and b");
    expect(nameThem(["a", "b", "c"])).toBe("a, b and c");
    expect(nameThem(["a", "b", "c", "d"])).toBe("a, b and 2 more");
  });
});
