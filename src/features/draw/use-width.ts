import { useSyncExternalStore } from 'react';

export type Width = 'desk' | 'tablet' | 'phone';

const desk = matchMedia('(min-width: 1180px)');
const phone = matchMedia('(max-width: 599px)');

/** How much room there is: everything beside the sheet, folded to its edges, or one column. */
export function useWidth(): Width {
  return useSyncExternalStore(listen, read);
}

function read(): Width {
  if (desk.matches) return 'desk';
  return phone.matches ? 'phone' : 'tablet';
}

function listen(listener: () => void): () => void {
  desk.addEventListener('change', listener);
  phone.addEventListener('change', listener);
  return () => {
    desk.removeEventListener('change', listener);
    phone.removeEventListener('change', listener);
  };
}
