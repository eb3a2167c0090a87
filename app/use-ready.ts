"use client";

import { useSyncExternalStore } from "react";

const never = () => () => undefined;

/** False on the server and until the page's script has taken over: what needs it is not offered before. */
export function useReady(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
