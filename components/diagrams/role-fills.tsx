import type { ReactNode } from "react";
import { clothFill, type ClothTile } from "@/components/ui/cloth";
import { ClothPattern } from "@/components/ui/cloth-patterns";
import type { Role, RoleId } from "@/lib/core/piece/drawing";

/** What fabric lies on a role. A role that has none is drawn in the grey of its value, with a hatch of its own. */
export type RoleCloth = Readonly<Record<RoleId, ClothTile | undefined>>;

export interface RoleFills {
  readonly fill: (role: RoleId | null) => string;
  /** Patterns to put into the drawing's defs. */
  readonly defs: ReactNode;
}

const GREYS = { light: ["#F1F1EC", "#B9BAB2"], medium: ["#C9CAC2", "#8D8F86"], dark: ["#7B7C74", "#4E4F49"] } as const;

/** Hatches in the order they are given out; a value never shares one, so grey alone need not tell roles apart. */
const HATCHES = ["", "M0 8L8 0M-2 2L2 -2M6 10L10 6", "M0 2h8M0 6h8", "M2 0v8M6 0v8", "M0 0L8 8M-2 6L2 10M6 -2L10 2", "M2 2h1v1h-1zM6 6h1v1h-1z", "M0 4h8M4 0v8", "M0 0L8 8M8 0L0 8"] as const;

/** Nothing laid yet: paper. */
const UNPAINTED = "var(--paper)";

/**
 * Fills for the roles of a drawing.
 *
 * @param id of the drawing, unique on the page, for its own patterns.
 * @param clothScale user units a pixel of the tile: where given, the drawing carries the fabrics' patterns itself, at
 * this scale; otherwise the page's `ClothPatterns` serve.
 */
export function roleFills(id: string, roles: readonly Role[], cloth: RoleCloth = {}, clothScale?: number): RoleFills {
  const bare = roles.filter((role) => !cloth[role.id]);
  const dressed = roles.flatMap((role) => cloth[role.id] ?? []);
  const tiles = clothScale === undefined ? [] : [...new Map(dressed.map((tile) => [tile.id, tile])).values()];
  const known = new Map(bare.map((role, index) => [role.id, `url(#${id}-role-${index}) ${GREYS[role.value][0]}`]));
  return {
    fill: (role) => {
      const tile = role === null ? undefined : cloth[role];
      if (tile) return clothScale === undefined ? `${clothFill(tile.id)} ${tile.colour}` : `url(#${patternOf(id, tiles.findIndex((each) => each.id === tile.id))}) ${tile.colour}`;
      return (role === null ? undefined : known.get(role)) ?? UNPAINTED;
    },
    defs: (
      <defs>
        {tiles.map((tile, index) => (
          <ClothPattern key={tile.id} id={patternOf(id, index)} fabric={tile} scale={clothScale} />
        ))}
        {bare.map((role, index) => (
          <GreyPattern key={role.id} id={`${id}-role-${index}`} value={role.value} hatch={HATCHES[index % HATCHES.length] ?? ""} />
        ))}
      </defs>
    ),
  };
}

function patternOf(id: string, index: number): string {
  return `${id}-cloth-${index}`;
}

function GreyPattern({ id, value, hatch }: { readonly id: string; readonly value: Role["value"]; readonly hatch: string }) {
  const [ground, line] = GREYS[value];
  return (
    <pattern id={id} width="8" height="8" patternUnits="userSpaceOnUse">
      <rect width="8" height="8" fill={ground} />
      {hatch === "" ? null : <path d={hatch} stroke={line} strokeWidth="1.2" fill="none" />}
    </pattern>
  );
}
