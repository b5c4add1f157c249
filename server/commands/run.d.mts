/** See run.mjs. */
export const ROOT: string;

export function runTypeScript(
  sentence: string,
  file: string,
  args: readonly string[],
  env: Readonly<Record<string, string | undefined>>,
): Promise<string>;
