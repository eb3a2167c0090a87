import type { RoleName } from "../lib/core/policy/policy";

/** The demo shop's people, all invented. The password is known to everybody, so they are seeded only into a demo. */
export const DEMO_PASSWORD = "clothroom-demo";

export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly roles: readonly RoleName[];
  readonly place: string;
}

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { name: "Ines Halloran", email: "ines@osierfalls.example", roles: ["owner"], place: "the office" },
  { name: "Juno Selwick", email: "juno@osierfalls.example", roles: ["manager"], place: "the office" },
  { name: "Pru Castellane", email: "pru@osierfalls.example", roles: ["designer"], place: "long table" },
  { name: "Tobias Reyne", email: "tobias@osierfalls.example", roles: ["cutter"], place: "table 1" },
  { name: "Marisela Oyelaran-Whitcombe", email: "marisela@osierfalls.example", roles: ["packer"], place: "packing bench" },
  { name: "Wen Adeyemi", email: "wen@osierfalls.example", roles: ["counter"], place: "till 1" },
];

/** What the start command prints. */
export const DEMO_ACCOUNTS = DEMO_PEOPLE.map(({ name, email, roles }) => ({ name, email, roles, password: DEMO_PASSWORD }));
