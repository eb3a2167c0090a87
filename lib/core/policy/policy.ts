/** Who may do what: one table. Nothing else in the house decides by role. */
export const ROLES = ["owner", "manager", "designer", "cutter", "packer", "counter"] as const;
export type RoleName = (typeof ROLES)[number];

const EVERYONE = ROLES;
const OFFICE: readonly RoleName[] = ["owner", "manager"];
const DESIGN: readonly RoleName[] = ["owner", "manager", "designer"];

const POLICY = {
  "today.see": EVERYONE,
  "find.see": EVERYONE,
  "block.see": EVERYONE,
  "block.save": DESIGN,
  "quilt.see": EVERYONE,
  "quilt.save": DESIGN,
  "kit.see": EVERYONE,
  "kit.save": DESIGN,
  "kit.cost": OFFICE,
  "plan.ask": DESIGN,
  "fabric.see": EVERYONE,
  "fabric.save": OFFICE,
  "bolt.see": EVERYONE,
  "bolt.receive": ["owner", "manager", "cutter"],
  "bolt.measure": ["owner", "manager", "cutter"],
  "bolt.flaw": ["owner", "manager", "cutter", "counter"],
  "bolt.move": ["owner", "manager", "cutter", "packer", "counter"],
  "run.see": EVERYONE,
  "run.start": OFFICE,
  "run.cancel": OFFICE,
  "run.cut": ["owner", "manager", "cutter"],
  "kit.pack": ["owner", "manager", "packer"],
  "till.sell": ["owner", "manager", "counter"],
  "till.open": ["owner", "manager", "counter"],
  "till.take-reserved": OFFICE,
  "till.see-expected": OFFICE,
  "exception.see": OFFICE,
  "exception.settle": OFFICE,
  "print.see": EVERYONE,
  "print.ask": EVERYONE,
  "people.see": OFFICE,
  "people.manage": ["owner"],
  "mail.read": ["owner"],
  "settings.see": OFFICE,
  "settings.save": ["owner"],
  "work.see": OFFICE,
} as const satisfies Record<string, readonly RoleName[]>;

export type Permission = keyof typeof POLICY;

/** A signed-in person, as read from the database for this request. */
export interface Actor {
  readonly personId: number;
  readonly sessionId: string;
  readonly name: string;
  readonly roles: readonly RoleName[];
  readonly place: string | null;
}

export const PERMISSIONS = Object.keys(POLICY) as Permission[];

export function can(actor: Pick<Actor, "roles">, permission: Permission): boolean {
  const allowed: readonly RoleName[] = POLICY[permission];
  return actor.roles.some((role) => allowed.includes(role));
}

/** The roles that hold a permission, for the sentence that refuses. */
export function holders(permission: Permission): readonly RoleName[] {
  return POLICY[permission];
}

export function isRole(value: unknown): value is RoleName {
  return ROLES.includes(value as RoleName);
}
