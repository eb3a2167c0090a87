import { PlainFault } from "./plain-fault.mjs";

/** What PostgreSQL and the network say most often, as a person would. */
const SENTENCES = new Map([
  ["ECONNREFUSED", "nothing listens there"],
  ["ENOTFOUND", "there is no such host"],
  ["EAI_AGAIN", "the host's name could not be looked up"],
  ["ETIMEDOUT", "it does not answer"],
  ["ECONNRESET", "it broke the connection off"],
  ["28P01", "it refuses the user or the password"],
  ["28000", "it refuses the user"],
  ["3D000", "it has no such database: make it empty first"],
  ["53100", "its disk is full"],
  ["53300", "it has no connection left"],
  ["57P03", "it is starting or stopping"],
]);

/**
 * Runs work on a database and turns its well-known faults into one sentence, without the password in the address.
 * @template T
 * @param {string} url @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function onDatabase(url, work) {
  try {
    return await work();
  } catch (error) {
    const fault = /** @type {{ code?: string, cause?: { code?: string } }} */ (error);
    const sentence = SENTENCES.get(fault.code ?? fault.cause?.code ?? "");
    if (!sentence) throw error;
    throw new PlainFault(`The database at ${withoutPassword(url)} cannot be used: ${sentence}.`, { cause: error });
  }
}

/** @param {string} url */
function withoutPassword(url) {
  try {
    const { host, pathname } = new URL(url);
    return `${host}${pathname}`;
  } catch {
    return "the address of DATABASE_URL, which is not one like postgres://user@host:5432/name,";
  }
}
