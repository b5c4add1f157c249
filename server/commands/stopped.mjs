/** Ends a command with one clear sentence for the person at the keyboard instead of a stack. */
export class Stopped extends Error {}

/** One sentence out of whatever went wrong: ours as it is, a full disk and a refused right in plain words. */
export function sentenceOf(error) {
  if (error instanceof Stopped) return error.message;
  const where = error?.path ? ` (${error.path})` : '';
  if (error?.code === 'ENOSPC') return `The disk is full${where}. Free some space and start again.`;
  if (error?.code === 'EDQUOT') return `Your share of the disk is used up${where}. Free some space and start again.`;
  if (error?.code === 'EROFS') return `The disk is read-only${where}. Ampwright has to write there.`;
  if (error?.code === 'EACCES' || error?.code === 'EPERM') {
    return `This user may not write there${where}. Give the folder to the user who starts Ampwright.`;
  }
  return undefined;
}

/** Prints the sentence, or the whole error where there is none for it, and ends with a failing exit code. */
export function endWith(error) {
  const sentence = sentenceOf(error);
  console.error(sentence ?? error);
  process.exit(1);
}
