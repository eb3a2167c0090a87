import { LonePage } from "@/components/shell/lone-page";
import { LinkButton } from "@/components/ui/link-button";

/** A page that this person's roles do not open. */
export default function Forbidden() {
  return (
    <LonePage title="Not for your roles" sub="This page is for other people of the shop. Ask the owner to add the role to you, if you need it.">
      <LinkButton href="/staff">Back to today</LinkButton>
    </LonePage>
  );
}
