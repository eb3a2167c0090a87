import type { Metadata } from "next";
import { LinkButton } from "@/components/ui/link-button";
import { LonePage } from "@/components/shell/lone-page";

export const metadata: Metadata = { title: "No such page" };

export default function NotFound() {
  return (
    <LonePage title="Nothing lies at this address" sub="The page was moved, or the address was written wrongly. What was wanted may be found by its name or its tag.">
      <LinkButton href="/staff">Go to today</LinkButton>
      <LinkButton href="/" variant="text">
        Go to the shop
      </LinkButton>
    </LonePage>
  );
}
