import { createContext, type RouterContextProvider } from "react-router";
import { config } from "./config";
import { type Database, type Db, openDatabase } from "./db/client";
import type { Actor } from "./domain/actor";

/** Who is at the other end of this request, as far as the wire tells. */
export interface Client {
  address: string;
  requestId: string;
}

/** A signed-in person in this request. */
export interface SignedIn {
  sessionId: string;
  actor: Actor;
  carrierName: string;
}

/** What this request asked for: where to come back to, and whether a program or a person reads the answer. */
export interface Asked {
  path: string;
  api: boolean;
}

/** Set by tests. A running server leaves it empty and opens its one database on first use. */
export const databaseContext = createContext<Database | null>(null);
/** Set by the outer server; the stock one tells nothing. */
export const clientContext = createContext<Client>({ address: "", requestId: "" });
export const askedContext = createContext<Asked>({ path: "/", api: false });
export const signedInContext = createContext<SignedIn | null>(null);

let opened: Database | null = null;

/** The process's one pool, opened on first use. */
export function database(): Database {
  opened ??= openDatabase(config().databaseUrl);
  return opened;
}

export async function closeDatabase(): Promise<void> {
  await opened?.close();
  opened = null;
}

export function databaseOf(context: Readonly<RouterContextProvider>): Database {
  return context.get(databaseContext) ?? database();
}

export function dbOf(context: Readonly<RouterContextProvider>): Db {
  return databaseOf(context).db;
}

export function clientOf(context: Readonly<RouterContextProvider>): Client {
  return context.get(clientContext);
}

export function signedInOf(context: Readonly<RouterContextProvider>): SignedIn | null {
  return context.get(signedInContext);
}
