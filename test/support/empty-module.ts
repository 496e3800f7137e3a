// Stands in for `server-only`, which refuses to load outside the server bundle.
export {}
