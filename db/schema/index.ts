export * from "./bench";
export * from "./mask";
export * from "./program";
export * from "./team";
