/** Something a person did at a station, kept on the device until the server has answered it with a 2xx. */
export interface Entry {
  /** The request's id, made before sending; the server answers it once. */
  readonly id: string;
  /** Entries of one lane (a bolt's tag, a till) go in order, one after the other; lanes do not wait for each other. */
  readonly lane: string;
  readonly path: string;
  readonly body: Readonly<Record<string, unknown>>;
  /** What it was, in words: "Cut 2 yd of Midnight Ferry for bag 2". */
  readonly said: string;
  readonly personId: number;
  /** Milliseconds since 1970 on the device's clock. */
  readonly madeAt: number;
  readonly state: "waiting" | "refused";
  /** Why the server refused it. */
  readonly refusal: string | null;
}

export type NewEntry = Pick<Entry, "lane" | "path" | "body" | "said" | "personId"> & { readonly id?: string };

/** How the sending of one entry ended. */
export type Answer =
  | { readonly kind: "taken"; readonly value: unknown }
  | { readonly kind: "refused"; readonly sentence: string }
  /** No network, a server that is down, a session that ended: it stays and is tried again. */
  | { readonly kind: "later"; readonly reason: "no-network" | "server-down" | "signed-out" };
