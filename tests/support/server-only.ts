// Stands in for the package "server-only", which throws outside Next by design.
export {};
