// Stands in for Next's `server-only` marker in tests.
export {}
