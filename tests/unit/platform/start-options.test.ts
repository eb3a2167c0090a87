import { describe, expect, it } from "vitest";
import { checkNode } from "@/scripts/packages.mjs";
import { startOptions } from "@/scripts/start/options.mjs";

describe("the options of the start command", () => {
  it("serves the demo on port 3000 unless told otherwise", () => {
    expect(startOptions([], {})).toEqual({ port: 3000, lan: false, demo: false, fresh: false, dev: false });
    expect(startOptions(["--port", "4100", "--dev"], {})).toMatchObject({ port: 4100, dev: true });
    expect(startOptions([], { PORT: "4200" })).toMatchObject({ port: 4200 });
  });

  it.each([
    [["--port", "0"], {}, "from 1 to 65535"],
    [["--port", "3000x"], {}, "not 3000x"],
    [["--poort", "1"], {}, "--poort"],
    [["--lan", "--dev"], {}, "--lan serves the built pages"],
    [["--fresh"], { DATABASE_URL: "postgres://shop" }, "DATABASE_URL is set"],
  ])("refuses %j with a sentence", (args, environment, sentence) => {
    expect(() => startOptions(args, environment)).toThrow(sentence);
  });

  it.each(["18.20.0", "20.8.1"])("refuses Node.js %s and names both versions", (version) => {
    expect(() => checkNode(version)).toThrow(`Node.js 20.9 or newer is needed, and this is ${version}.`);
  });

  it.each(["20.9.0", "22.0.0"])("accepts Node.js %s", (version) => {
    expect(() => checkNode(version)).not.toThrow();
  });
});
