import type { TransactionSql } from 'postgres';

export type Send = TransactionSql['unsafe'];

/** A statement with more parameters than this holds a long list; it is seldom sent again with as many. */
const MOST = 60;

/**
 * Drizzle's way to send a statement, so that PostgreSQL keeps the plan of each. Drizzle asks for that only where a query
 * was named; all others would be parsed, described and planned anew at each call, in two round trips.
 * What a connection keeps ends with it: the driver closes each after half an hour to an hour.
 */
export function keepingPlans(send: Send): Send {
  return (text, parameters = [], options) =>
    send(text, parameters, { ...options, prepare: parameters.length <= MOST });
}
