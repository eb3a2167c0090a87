import type { Length } from "../measure/length";
import type { CutPiece } from "../piece/cut-piece";
import type { RoleId } from "../piece/drawing";
import { fail, ok, type Result } from "../result";
import type { KitFabric } from "./kit-plan";

/** A fabric that roles can be put to. */
export interface FabricChoice {
  readonly fabric: string;
  readonly name: string;
  readonly usableWidth: Length;
}

/**
 * Gathers a quilt's cut pieces by the fabric that each role is put to, so that two roles in one fabric are planned together
 * and share their strips. Fabrics in the order in which the pieces first want them; pieces in the order of the list.
 *
 * @param fabricOf role to fabric.
 * @returns `role-without-fabric` (facts.roles) lists every role that is put to nothing; `unknown-fabric` names the fabric.
 */
export function fabricsOf(pieces: readonly CutPiece[], fabricOf: Readonly<Record<RoleId, string>>, choices: readonly FabricChoice[]): Result<KitFabric[], "role-without-fabric" | "unknown-fabric"> {
  const roles = [...new Set(pieces.map((piece) => piece.role))];
  const bare = roles.filter((role) => !Object.hasOwn(fabricOf, role));
  if (bare.length > 0) return fail("role-without-fabric", `No fabric is put to ${listed(bare)}. Choose one for each role.`, { facts: { roles: bare } });
  const fabrics: KitFabric[] = [];
  for (const fabric of new Set(roles.map((role) => fabricOf[role] ?? ""))) {
    const choice = choices.find((each) => each.fabric === fabric);
    if (!choice) return fail("unknown-fabric", `The fabric put to ${listed(roles.filter((role) => fabricOf[role] === fabric))} is not among the shop's fabrics any more.`, { facts: { fabric } });
    const own = roles.filter((role) => fabricOf[role] === fabric);
    fabrics.push({ ...choice, roles: own, pieces: pieces.filter((piece) => own.includes(piece.role)) });
  }
  return ok(fabrics);
}

function listed(names: readonly string[]): string {
  const last = names.at(-1) ?? "";
  return names.length < 2 ? last : `${names.slice(0, -1).join(", ")} and ${last}`;
}
