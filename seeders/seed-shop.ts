import { hashPassword } from "../lib/data/people/passwords";
import { db } from "../models/database";
import { DEMO_FABRICS } from "./demo-fabrics";
import { DEMO_PASSWORD, DEMO_PEOPLE } from "./demo-people";
import { DEMO_SHOP, DEMO_SUPPLIERS, DEMO_TAX, DEMO_TILLS } from "./demo-shop";
import { inches, yards } from "../lib/core/measure/length";

/** The shop, its people, suppliers, tills, tax and fabrics; each row only where it is missing. */
export async function seedShop(): Promise<void> {
  const { Shop, Person, TaxRate, Till, Supplier, Fabric } = db();
  await Shop.findOrCreate({ where: { id: 1 }, defaults: DEMO_SHOP });
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  for (const { name, email, roles, place } of DEMO_PEOPLE) {
    await Person.findOrCreate({ where: { email }, defaults: { name, email, roles: [...roles], place, passwordHash } });
  }
  for (const rate of DEMO_TAX) await TaxRate.findOrCreate({ where: { name: rate.name, goods: rate.goods }, defaults: rate });
  for (const name of DEMO_TILLS) await Till.findOrCreate({ where: { name }, defaults: { name } });
  for (const supplier of DEMO_SUPPLIERS) await Supplier.findOrCreate({ where: { name: supplier.name }, defaults: supplier });
  const suppliers = new Map((await Supplier.findAll({ raw: true })).map((supplier) => [supplier.name, supplier.id]));
  for (const fabric of DEMO_FABRICS) {
    await Fabric.findOrCreate({
      where: { slug: fabric.slug },
      defaults: {
        slug: fabric.slug,
        name: fabric.name,
        reference: fabric.reference,
        description: fabric.description,
        supplierId: suppliers.get(fabric.supplier) ?? null,
        width: inches(fabric.usableInches + 2),
        usableWidth: inches(fabric.usableInches),
        fibre: "100 % cotton",
        origin: "Portugal",
        oneWay: fabric.oneWay ?? false,
        tile: `/fabrics/${fabric.slug}.svg`,
        colour: fabric.colour,
        value: fabric.value,
        price: fabric.price,
        cost: fabric.cost,
        lowMark: yards(fabric.lowYards),
        inPrint: fabric.inPrint ?? true,
      },
    });
  }
}
