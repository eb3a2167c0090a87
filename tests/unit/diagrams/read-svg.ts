/** The attributes of an element of a drawing, as written. */
export type Attributes = Readonly<Record<string, string>>;

/** Every element of one name, or every one with that value of an attribute, in drawing order. */
export function elements(markup: string, name: string, where: Attributes = {}): Attributes[] {
  return [...markup.matchAll(new RegExp(`<${name}((?:\\s[a-zA-Z0-9:-]+="[^"]*")*)\\s*/?>`, "g"))]
    .map((match) => Object.fromEntries([...(match[1] ?? "").matchAll(/([a-zA-Z0-9:-]+)="([^"]*)"/g)].map((pair) => [pair[1] ?? "", pair[2] ?? ""])))
    .filter((attributes) => Object.entries(where).every(([key, value]) => attributes[key] === value));
}

/** An attribute as a number; NaN where it is not there, which no test takes for a figure. */
export function figure(element: Attributes | undefined, attribute: string): number {
  return Number(element?.[attribute] ?? NaN);
}

/** The texts of a drawing, in order. */
export function texts(markup: string): string[] {
  return [...markup.matchAll(/<text[^>]*>([^<]*)<\/text>/g)].map((match) => match[1] ?? "");
}

export function labelOf(markup: string): string {
  return (/<svg[^>]* aria-label="([^"]*)"/.exec(markup)?.[1] ?? "").replaceAll("&#x27;", "'");
}
