import { can, type Actor, type Permission } from "@/lib/core/policy/policy";

export interface Section {
  readonly href: string;
  readonly label: string;
  readonly permission: Permission;
}

/** The rooms of the back office, in the order of the work: drawn, cut, sold, and what keeps it going. */
export const SECTIONS: readonly Section[] = [
  { href: "/staff", label: "Today", permission: "today.see" },
  { href: "/staff/blocks", label: "Blocks", permission: "block.see" },
  { href: "/staff/kits", label: "Kits", permission: "kit.see" },
  { href: "/staff/bolts", label: "Bolts", permission: "bolt.see" },
  { href: "/staff/runs", label: "Runs", permission: "run.see" },
  { href: "/table", label: "Cutting", permission: "run.cut" },
  { href: "/staff/packing", label: "Packing", permission: "kit.pack" },
  { href: "/counter", label: "Counter", permission: "till.sell" },
];

/** What lies on the slip under the person's name. */
export const OFFICE_SECTIONS: readonly Section[] = [{ href: "/staff/design", label: "Component sheet", permission: "work.see" }];

export function sectionsFor(person: Pick<Actor, "roles">, sections: readonly Section[] = SECTIONS): readonly Section[] {
  return sections.filter((section) => can(person, section.permission));
}

/** Today stands at the address that all rooms begin with, so it is current only on its own page. */
const TODAY = "/staff";

/** The section a path lies in. */
export function currentSection(path: string, sections: readonly Section[]): Section | null {
  return sections.find((section) => path === section.href || (section.href !== TODAY && path.startsWith(`${section.href}/`))) ?? null;
}
