"use client";

import { LonePage } from "@/components/shell/lone-page";
import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";

interface ErrorPageProps {
  readonly error: Error & { digest?: string };
  readonly reset: () => void;
}

/** A fault of the programme's own. What was saved before it is saved; the mark finds it in the log. */
export default function ErrorPage({ error, reset }: ErrorPageProps) {
  return (
    <LonePage
      title="This page could not be made"
      sub={
        <>
          The fault is on our side. What was already recorded is safe; what was typed and not yet sent may have to be written again.
          {error.digest ? ` It is in the log under ${error.digest}.` : ""}
        </>
      }
    >
      <Button onClick={reset}>Try again</Button>
      <LinkButton href="/staff" variant="text">
        Go to today
      </LinkButton>
    </LonePage>
  );
}
