import type { FileStore } from "@/lib/auth/context";

/** Files in memory: what a test stores goes with it. */
export function memoryFiles(): FileStore {
  const files = new Map<string, Uint8Array>();
  return {
    put: async (key, bytes) => {
      files.set(key, bytes);
    },
    get: async (key) => files.get(key) ?? null,
  };
}
