/**
 * The version of the whole rule set. Every published figure and every report figure carries it, so that a reader can
 * tell which rules made a number, and so that a recomputation knows which rows are old. Raise it when any rule or
 * parameter in lib/measurement changes a result.
 */
export const RULE_VERSION = '1';
