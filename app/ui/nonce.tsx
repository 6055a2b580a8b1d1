import { createContext, useContext } from "react";

/** The nonce of this response's inline scripts; undefined in the browser and in prerendered pages. */
export const NonceContext = createContext<string | undefined>(undefined);

export function useNonce(): string | undefined {
  return useContext(NonceContext);
}
