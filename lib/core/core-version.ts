/** Goes up whenever the same input may give another answer; kept plans of another version are made again. */
export const CORE_VERSION = "1";
