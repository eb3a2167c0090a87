import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { ClothLength, Inches, Metres, Money, Yards } from "@/components/ui/figures";
import { centimetres, inches, length, yards } from "@/lib/core/measure/length";

/** What is seen: everything that is not meant for listeners only. */
function seen(markup: string): string {
  return markup.replaceAll(/<span class="sr">[^<]*<\/span>/g, "").replaceAll(/<[^>]*>/g, "");
}

/** What is said: everything that is not hidden from listeners. */
function said(markup: string): string {
  return markup.replaceAll(/<span aria-hidden="true">[^<]*<\/span>/g, "").replaceAll(/<[^>]*>/g, "");
}

describe("figures", () => {
  it("writes yards with the fraction slash and says them in words", () => {
    const markup = renderToStaticMarkup(<Yards value={yards(2.375)} />);
    expect(seen(markup)).toBe("2 3\u20448yd");
    expect(said(markup)).toBe("2 and 3 eighths yards");
    expect(markup).toContain('class="q"');
  });

  it("says one yard, and part of a yard, in the singular", () => {
    expect(said(renderToStaticMarkup(<Yards value={yards(1)} />))).toBe("1 yard");
    expect(said(renderToStaticMarkup(<Yards value={yards(0.75)} />))).toBe("3 quarters yard");
    expect(said(renderToStaticMarkup(<Yards value={yards(0)} />))).toBe("0 yards");
  });

  it("never rounds a length away: what lies beyond the marks is given in inches", () => {
    expect(seen(renderToStaticMarkup(<Yards value={inches(87)} />))).toBe("2 3\u20448yd 1 1\u20442in");
    expect(seen(renderToStaticMarkup(<Yards value={inches(1.5)} />))).toBe("1 1\u20442in");
    expect(seen(renderToStaticMarkup(<Yards value={yards(2 + 3 / 16)} />))).toBe("2 3\u204416yd");
  });

  it("leaves the unit out where the column names it, but not where it would mislead", () => {
    expect(seen(renderToStaticMarkup(<Yards value={yards(2.5)} bare />))).toBe("2 1\u20442");
    expect(seen(renderToStaticMarkup(<Yards value={inches(87)} bare />))).toBe("2 3\u20448yd 1 1\u20442in");
  });

  it("marks thousands, and shortfalls with a true minus", () => {
    expect(seen(renderToStaticMarkup(<Yards value={yards(1306.5)} />))).toBe("1,306 1\u20442yd");
    const short = renderToStaticMarkup(<Yards value={length(-yards(1.125))} />);
    expect(seen(short)).toBe("\u22121 1\u20448yd");
    expect(said(short)).toContain("minus 1 and 1 eighth");
  });

  it("writes inches down to 1/32", () => {
    expect(seen(renderToStaticMarkup(<Inches value={inches(3 + 13 / 16)} />))).toBe("3 13\u204416in");
    expect(said(renderToStaticMarkup(<Inches value={inches(0.5)} bare />))).toBe("half");
  });

  it("says metres as a metric counter does", () => {
    const markup = renderToStaticMarkup(<Metres value={centimetres(140)} />);
    expect(seen(markup)).toBe("1 m 40");
    expect(said(markup)).toBe("1 metre 40");
    expect(said(renderToStaticMarkup(<ClothLength system="metres" value={centimetres(85)} />))).toBe("85 centimetres");
  });

  it("writes money with or without its sign", () => {
    expect(seen(renderToStaticMarkup(<Money minor={1284735} currency="USD" />))).toBe("$12,847.35");
    expect(seen(renderToStaticMarkup(<Money minor={-1250} currency="USD" bare />))).toBe("\u221212.50");
    expect(seen(renderToStaticMarkup(<Money minor={1240} currency="JPY" bare />))).toBe("1,240");
  });
});
