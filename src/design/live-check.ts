import type { Design } from '#shared/model/design.ts';

import type { CheckAnswer, CheckWord } from './check-worker.ts';
import { differenceBetween } from './difference.ts';

/** The check that runs beside the page: it keeps its own design and is told only what changed. */
export interface LiveCheck {
  /** The state that is to be checked now; its number. */
  follow(design: Design): number;
  stop(): void;
}

export function startLiveCheck(first: Design, onAnswer: (answer: CheckAnswer) => void): LiveCheck {
  const worker = new Worker(new URL('./check-worker.ts', import.meta.url), { type: 'module', name: 'check' });
  const tell = (word: CheckWord) => worker.postMessage(word);
  let known = first;
  let turn = 1;
  worker.addEventListener('message', (event: MessageEvent<CheckAnswer>) => onAnswer(event.data));
  tell({ word: 'open', turn, design: first });
  return {
    follow(design) {
      const patches = differenceBetween(known, design);
      known = design;
      if (patches.length === 0) return turn;
      turn += 1;
      tell({ word: 'change', turn, patches });
      return turn;
    },
    stop: () => worker.terminate(),
  };
}
