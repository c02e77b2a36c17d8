/** A process that does nothing: what others need is measured above it. */
export {};
