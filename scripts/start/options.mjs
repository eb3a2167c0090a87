import { parseArgs } from "node:util";
import { PlainFault } from "../plain-fault.mjs";

const HELP = `npm start -- [options]
  --port 3000   the port to serve on
  --lan         serve https to tablets in this network
  --demo        put the demo's shop into the database of DATABASE_URL as well
  --fresh       forget the demo's data and begin again
  --dev         serve the sources as they are, for development`;

/**
 * @typedef {{ port: number, lan: boolean, demo: boolean, fresh: boolean, dev: boolean }} StartOptions
 */

/**
 * @param {string[]} args @param {{ PORT?: string, DATABASE_URL?: string }} environment
 * @returns {StartOptions | null} null when only help was asked for.
 */
export function startOptions(args, environment) {
  const flag = /** @type {const} */ ({ type: "boolean", default: false });
  let values;
  try {
    ({ values } = parseArgs({ args, options: { port: { type: "string" }, lan: flag, demo: flag, fresh: flag, dev: flag, help: flag } }));
  } catch (error) {
    throw new PlainFault(`${/** @type {Error} */ (error).message}\n\n${HELP}`);
  }
  if (values.help) {
    console.log(HELP);
    return null;
  }
  const said = values.port ?? (environment.PORT || "3000");
  const port = Number(said);
  if (!/^\d+$/.test(said) || port < 1 || port > 65_535) throw new PlainFault(`A port is a number from 1 to 65535, not ${said}.`);
  if (values.lan && values.dev) throw new PlainFault("--lan serves the built pages, so it does not go together with --dev.");
  if (values.fresh && environment.DATABASE_URL) throw new PlainFault("--fresh forgets only the data that npm start itself made. DATABASE_URL is set: empty that database yourself.");
  return { port, lan: values.lan, demo: values.demo, fresh: values.fresh, dev: values.dev };
}
