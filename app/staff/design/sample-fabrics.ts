import type { ClothTile } from "@/components/ui/cloth";

/** Fabrics drawn as tiles, for the component sheet. */
export const FABRICS: readonly (ClothTile & { readonly name: string })[] = [
  { id: "ferry", name: "Midnight Ferry", tile: "/fabrics/ferry.svg", colour: "#23365F" },
  { id: "flour", name: "Flour Sack", tile: "/fabrics/flour.svg", colour: "#F3F1EA" },
  { id: "larder", name: "Larder Stripe on unbleached ticking, extra wide", tile: "/fabrics/larder.svg", colour: "#F0E8DA" },
  { id: "toll", name: "Turnpike Plaid", tile: "/fabrics/toll.svg", colour: "#EFE3BC" },
  { id: "osier", name: "Osier Leaf", tile: "/fabrics/osier.svg", colour: "#8CA684" },
];
