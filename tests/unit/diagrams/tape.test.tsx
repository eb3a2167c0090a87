import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { RunTape, type RunStop } from "@/components/diagrams/run-tape";
import { Tape } from "@/components/diagrams/tape";
import { TapeAxis, yardLines } from "@/components/diagrams/tape-axis";
import { figureStep, tapeTicks, tickStep } from "@/components/diagrams/tape-scale";
import { length, metres, PER_EIGHTH_YARD, PER_METRE, PER_YARD, yards } from "@/lib/core/measure/length";
import { elements, figure, labelOf, texts } from "./read-svg";

const FERRY = { id: "7", tile: "/fabrics/ferry.svg", colour: "#23365F" };
/** 10 px a yard. */
const TEN = { width: 152, max: yards(15), system: "yards" as const };

describe("a bolt's tape", () => {
  it("is as long as what is left, from the core at the left to the cut edge", () => {
    const markup = renderToStaticMarkup(<Tape {...TEN} putUp={yards(15)} left={yards(9)} cloth={FERRY} full />);
    const [cloth] = elements(markup, "rect", { "data-mark": "cloth" });
    expect([figure(cloth, "x"), figure(cloth, "width")]).toEqual([1, 90]);
    expect(cloth?.["fill"]).toBe("url(#cloth-7) #23365F");
    expect(elements(markup, "path", { "data-mark": "cut-edge" })[0]?.["d"]).toMatch(/^M91 /);
    expect(elements(markup, "path", { "data-mark": "cut-edge" })[0]?.["stroke-width"]).toBe("3");
    expect(elements(markup, "rect", { "data-mark": "tape" }).map((each) => figure(each, "width"))).toEqual([90]);
  });

  it("leaves a dotted ghost to the full put-up, and none on a whole bolt", () => {
    const cut = renderToStaticMarkup(<Tape {...TEN} putUp={yards(15)} left={yards(9)} />);
    const [ghost] = elements(cut, "rect", { "data-mark": "ghost" });
    expect([figure(ghost, "x"), figure(ghost, "width"), ghost?.["stroke-dasharray"]]).toEqual([91, 60, "3 4"]);
    expect(elements(renderToStaticMarkup(<Tape {...TEN} putUp={yards(9)} left={yards(9)} />), "rect", { "data-mark": "ghost" })).toEqual([]);
  });

  it("hatches what is reserved and marks both edges of a flaw", () => {
    const markup = renderToStaticMarkup(<Tape {...TEN} putUp={yards(15)} left={yards(9)} reserved={[{ from: yards(3), to: yards(9), label: "WP" }]} flaws={[{ from: yards(1), to: yards(2) }]} />);
    expect(markup.match(/data-mark="reserved"/g)).toHaveLength(1);
    const hatched = elements(markup, "rect").filter((each) => each["fill"]?.endsWith("-reserved)"));
    expect(hatched.map((each) => [figure(each, "x"), figure(each, "width")])).toEqual([[31, 60]]);
    const flawed = elements(markup, "rect").filter((each) => each["fill"]?.endsWith("-flaw)"));
    expect(flawed.map((each) => [figure(each, "x"), figure(each, "width")])).toEqual([[11, 10]]);
    expect(texts(markup)).toContain("WP");
  });

  it("says everything that it draws", () => {
    const markup = renderToStaticMarkup(
      <Tape {...TEN} name="Midnight Ferry" putUp={yards(15)} left={yards(9.375)} reserved={[{ from: yards(3.375), to: yards(9.375), label: "WP" }]} flaws={[{ from: yards(1.5), to: yards(1.75) }]} lowMark={yards(3)} />,
    );
    expect(labelOf(markup)).toBe(
      "Midnight Ferry: 9 and 3 eighths yards on the bolt; of 15 yards put up; 6 yards reserved for WP; a flaw from 1 and a half yards to 1 and 3 quarters yards from the core; the low mark is 3 yards.",
    );
    expect(markup).toContain('role="img"');
  });

  it("veils all but the piece to cut, which is dashed, and says what stays", () => {
    const markup = renderToStaticMarkup(<Tape {...TEN} putUp={yards(9)} left={yards(9)} cutNow={{ from: yards(7), to: yards(9) }} />);
    expect(elements(markup, "rect", { "data-mark": "veil" }).map((each) => [figure(each, "x"), figure(each, "width")])).toEqual([[1, 70]]);
    const [cut] = elements(markup, "rect", { "data-mark": "cut-now" });
    expect([figure(cut, "x"), figure(cut, "width"), cut?.["stroke-dasharray"]]).toEqual([71, 20, "8 6"]);
    expect(labelOf(markup)).toContain("to cut now 2 yards, which leaves 7 yards");
  });

  it("draws an empty bolt as its core and its ghost", () => {
    const markup = renderToStaticMarkup(<Tape {...TEN} putUp={yards(8)} left={length(0)} />);
    expect(elements(markup, "rect", { "data-mark": "cloth" })).toEqual([]);
    expect(labelOf(markup)).toBe("nothing left on the bolt; of 8 yards put up.");
  });

  it("gives every pattern an id of its own", () => {
    const flaw = [{ from: yards(1), to: yards(2) }];
    const markup = renderToStaticMarkup(<><Tape {...TEN} putUp={yards(9)} left={yards(9)} flaws={flaw} /><Tape {...TEN} putUp={yards(9)} left={yards(9)} flaws={flaw} /></>);
    const ids = elements(markup, "pattern").map((each) => each["id"]);
    expect(new Set(ids).size).toBe(2);
  });
});

describe("ticks", () => {
  it("show eighths from 4 px each, else quarters, halves, yards", () => {
    const at = (pixelsPerEighth: number) => tickStep(pixelsPerEighth / PER_EIGHTH_YARD, "yards") / PER_EIGHTH_YARD;
    expect([at(4), at(3.9), at(2), at(1.9), at(1), at(0.9)]).toEqual([1, 2, 2, 4, 4, 8]);
  });

  it("step ten centimetres on a metric tape", () => {
    expect(tickStep(40 / PER_METRE, "metres")).toBe(PER_METRE / 10);
    expect(tapeTicks(metres(1), 40 / PER_METRE, "metres")).toHaveLength(11);
  });

  it("are true: every one lies on its step, and yards run right across", () => {
    const ticks = tapeTicks(yards(2), 100 / PER_YARD, "yards");
    expect(ticks.map((tick) => tick.at / PER_EIGHTH_YARD)).toEqual(Array.from({ length: 17 }, (_, index) => index));
    expect(ticks.filter((tick) => tick.part === 1).map((tick) => tick.at / PER_YARD)).toEqual([0, 1, 2]);
  });

  it("are named as often as there is room", () => {
    expect(figureStep(100 / PER_YARD, "yards")).toBe(1);
    expect(figureStep(10 / PER_YARD, "yards")).toBe(3);
  });
});

describe("the axis of a table", () => {
  it("names its unit at the last figure and puts figures where the tapes have them", () => {
    const markup = renderToStaticMarkup(<TapeAxis width={302} max={yards(15)} system="yards" />);
    expect(texts(markup)).toEqual(["0", "3", "6", "9", "12", "15 yd"]);
    expect(elements(markup, "text").map((each) => figure(each, "x"))).toEqual([1, 61, 121, 181, 241, 301]);
    expect(labelOf(markup)).toBe("Scale from 0 to 15 yards.");
  });

  it("carries a faint line down the column for every yard", () => {
    expect(yardLines({ width: 302, max: yards(15), system: "yards" })["backgroundImage"]).toContain("transparent 1px 20.000px");
  });
});

describe("a run's tape", () => {
  const stop = (key: string, count: number, each: number, done: number): RunStop => ({
    key,
    place: `W1 · 0${key}`,
    name: `Fabric ${key}`,
    cloth: FERRY,
    lengths: Array.from({ length: count }, (_, index) => ({ length: yards(each), done: index < done })),
  });
  const stops = [stop("1", 3, 1, 3), stop("2", 3, 2, 1), stop("3", 1, 1, 0)];
  const markup = renderToStaticMarkup(<RunTape stops={stops} now="2" width={1006} system="yards" />);

  it("lays the lengths end to end, with the yellow tape under what is cut", () => {
    expect(elements(markup, "rect", { "data-mark": "tape" }).map((each) => [figure(each, "x"), figure(each, "width")])).toEqual([
      [3, 300],
      [303, 200],
    ]);
    expect(elements(markup, "rect", { "data-mark": "veil" }).map((each) => [figure(each, "x"), figure(each, "width")])).toEqual([
      [503, 400],
      [903, 100],
    ]);
    expect(elements(markup, "path", { "data-mark": "now" })[0]?.["d"]).toMatch(/^M492 /);
  });

  it("says how far each bolt is", () => {
    expect(texts(markup)).toEqual(["W1 · 01", "3 cut", "W1 · 02", "1 of 3 × 2 yd", "W1 · 03", "1 × 1 yd"]);
    expect(labelOf(markup)).toBe("The run in shelf order, 10 yards: Fabric 1 on W1 · 01, all 3 cut; Fabric 2 on W1 · 02, 1 of 3 cut, on the table now; Fabric 3 on W1 · 03, 1 to cut.");
  });
});
