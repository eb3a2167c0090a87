import type { InstructionSheetInput, SheetFabric, SheetStep } from "@/labels/sheet/sheet-input";
import { length } from "@/lib/core/measure/length";
import type { QuiltDesign } from "@/lib/core/piece/quilt-design";
import type { KitFacts } from "./kit-facts";
import { blockPages, hatchOfFabric, quiltPicture } from "./quilt-pictures";

/** The instruction sheet of a kit as plain data: cutting from the kept plan, then each block and the quilt. */
export function sheetContentOf(facts: KitFacts): InstructionSheetInput {
  const { kit, colourway, quilt, shop, ink, plan } = facts;
  const { design } = quilt;
  const { shrinkAlong, shrinkAcross } = kit.allowance;
  return {
    kitName: kit.name,
    colourway: colourway.name,
    shopName: shop.name,
    credit: "",
    version: `Version ${kit.version}`,
    finished: quilt.size,
    quilt: quiltPicture(design, ink),
    kind: kit.format,
    fabrics: facts.fabrics.map((fabric, index) => sheetFabric(facts, fabric, index)),
    notions: facts.notions.map(({ name, count }) => ({ name, amount: String(count) })),
    alsoNeeded: [...(design.backing ? [] : ["backing"]), "batting", ...(design.binding ? [] : ["binding"]), "thread for piecing and quilting"],
    seamAllowance: kit.rules.seamAllowance,
    usableWidth: length(Math.min(...plan.fabrics.map((each) => each.usableWidth))),
    prewash: shrinkAlong > 0 || shrinkAcross > 0,
    smallParts: kit.smallParts,
    blocks: blockPages(design, ink),
    assembly: assemblySteps(design),
    measure: shop.system,
    paper: shop.paper,
    language: shop.locale,
  };
}

function sheetFabric({ colourway, quilt, plan, kit }: KitFacts, fabric: KitFacts["fabrics"][number], index: number): SheetFabric {
  const planned = plan.fabrics.find((each) => each.fabric === String(fabric.id));
  const roles = quilt.design.roles.filter((role) => colourway.fabrics[role.id] === fabric.id).map((role) => role.name);
  const held = colourway.lengths.find((each) => each.fabricId === fabric.id)?.cutLength ?? 0;
  const laid = planned && planned.blanks.length > 0 && kit.format !== "pre-cut";
  return {
    name: fabric.name,
    role: roles.join(", "),
    colour: fabric.colour,
    hatch: hatchOfFabric(index),
    length: length(held),
    fits: planned?.allowance.fits ?? null,
    pieces: planned?.pieces ?? [],
    layout: laid ? { plan: planned.plan, blanks: planned.blanks } : null,
    remarks: fabric.oneWay ? ["This print has a direction: cut each piece the way the cut map shows."] : [],
  };
}

/** The quilt from its squares outwards. */
function assemblySteps(design: QuiltDesign): SheetStep[] {
  const step = (title: string, text: string, note = ""): SheetStep => ({ title, note, text, before: [], after: null });
  const { sashing, borders, binding } = design;
  const steps = [
    design.setting === "straight"
      ? step("Lay the quilt out", `Lay the blocks out as in the picture: ${design.rows} rows of ${design.columns}.`)
      : step("Lay the quilt out", "Lay the blocks out on point as in the picture, with the side triangles round them and the corner triangles last."),
    step("Sew the rows", `${sashing ? "Sew the short sashing strips between the blocks of a row. " : ""}Sew each row together. Press the seams of one row to the left and of the next to the right, so that they nest.`),
    step("Join the rows", sashing ? "Sew the long sashing between the rows, matching the seams." : "Sew the rows together, matching the seams."),
  ];
  borders.forEach((border, index) => {
    const which = borders.length > 1 ? `Border ${index + 1}` : "The border";
    steps.push(step(which, `Measure the quilt through its middle and cut the border strips to that measure. Sew on two opposite sides, then ${border.corners ? "the other two with their corner squares" : "the other two"}. Press towards the border.`));
  });
  steps.push(step("Quilt it", "Layer the top with batting and backing, baste, and quilt as you like."));
  if (binding) steps.push(step("Bind it", "Join the binding strips with slanting seams, fold the strip in half along its length, sew it round the quilt and turn it to the back."));
  return steps;
}
