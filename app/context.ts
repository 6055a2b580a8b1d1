import { createContext, type RouterContextProvider } from "react-router";
import { config } from "./config";
import { type Database, openDatabase } from "./db/client";
import type { Db } from "./db/client";
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

export const clientContext = createContext<Client>();
export const databaseContext = createContext<Db>();
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

export function dbOf(context: Readonly<RouterContextProvider>): Db {
  return context.get(databaseContext);
}

export function clientOf(context: Readonly<RouterContextProvider>): Client {
  return context.get(clientContext);
}

export function signedInOf(context: Readonly<RouterContextProvider>): SignedIn | null {
  return context.get(signedInContext);
}
