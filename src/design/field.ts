/** What stands at a path of the document; undefined where there is nothing. */
export function readField(document: object, path: readonly string[]): unknown {
  return path.reduce<unknown>(
    (at, key) =>
      typeof at === 'object' && at !== null && Object.hasOwn(at, key)
        ? (at as Record<string, unknown>)[key]
        : undefined,
    document,
  );
}
