import { people } from "./foundation/people";
import { shop } from "./foundation/shop";
import { designs } from "./foundation/designs";
import { stock } from "./foundation/stock";
import { runs } from "./foundation/runs";
import { counter } from "./foundation/counter";
import { work } from "./foundation/work";

export const up = [people, shop, designs, stock, runs, counter, work].join("\n");
