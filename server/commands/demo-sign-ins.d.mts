import type { DemoSignIn } from '#server/demo/seed-demo.ts';

/** See demo-sign-ins.mjs. */
export function readDemoSignIns(folder: string): readonly DemoSignIn[];
