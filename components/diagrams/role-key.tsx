import { useId } from "react";
import { Swatch } from "@/components/ui/swatch";
import type { Role, RoleId } from "@/lib/core/piece/drawing";
import { INK } from "./ink";
import { roleFills, type RoleCloth } from "./role-fills";

interface RoleKeyProps {
  readonly roles: readonly Role[];
  readonly cloth?: RoleCloth;
  /** What lies on a role, in words: the fabric's name and lot. */
  readonly said?: Readonly<Record<RoleId, string | undefined>>;
}

/**
 * The names beside a drawing's fills: a role's swatch where it has a fabric, else the grey and hatch that stand for it.
 * Greys are those of a drawing that is given the same roles in the same order.
 */
export function RoleKey({ roles, cloth = {}, said = {} }: RoleKeyProps) {
  const id = `key-${useId().replaceAll(/[^A-Za-z0-9_-]/g, "")}`;
  const fills = roleFills(id, roles, cloth);
  return (
    <ul className="role-key" style={{ listStyle: "none", margin: 0, padding: 0, display: "flex", flexWrap: "wrap", gap: "6px 18px" }}>
      {roles.map((role, index) => (
        <li key={role.id} style={{ display: "flex", alignItems: "center", gap: 9 }}>
          {cloth[role.id] ? (
            <Swatch fabric={cloth[role.id] ?? null} width={32} height={24} />
          ) : (
            <svg width="32" height="24" viewBox="0 0 32 24" aria-hidden="true">
              {index === roles.findIndex((each) => !cloth[each.id]) ? fills.defs : null}
              <rect x=".5" y=".5" width="31" height="23" fill={fills.fill(role.id)} stroke={INK} strokeOpacity=".35" />
            </svg>
          )}
          <span>
            {role.name}
            {said[role.id] ? `: ${said[role.id] ?? ""}` : `, ${role.value}`}
          </span>
        </li>
      ))}
    </ul>
  );
}
