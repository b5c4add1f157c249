import { Router } from 'express';

import { streamNews } from '#shared/api/design.ts';
import { may } from '#shared/access/matrix.ts';
import { readDesignRow } from '#server/db/design-queries.ts';
import { readStanding } from '#server/db/standing-queries.ts';
import { serve } from '#server/http/serve.ts';
import { isSessionOpen } from '#server/live/news-desk.ts';
import { NotFound } from '#server/refusals.ts';

export const newsRoutes = Router();

const HEARTBEAT_MS = 15_000;

/** What is waiting in a connection that takes nothing before it is given up; the reader resumes from where it was. */
const MOST_WAITING_BYTES = 4_000_000;

serve(newsRoutes, streamNews, 'see-design', async ({ params, query, caller, db, house, request, response }) => {
  const { vesselId } = params;
  const row = await readDesignRow(db, vesselId);
  if (row === undefined) throw new NotFound();

  response.status(200);
  response.set({ 'Content-Type': 'text/event-stream', 'Cache-Control': 'no-store', 'X-Accel-Buffering': 'no' });
  response.flushHeaders();
  response.write('retry: 2000\n\n');

  const end = () => response.end();
  const mayStillRead = async () => {
    const standing = await readStanding(db, vesselId, caller.personId);
    if (standing === undefined || standing.deletedAt !== null || !may(standing.role, 'see-design')) return false;
    return isSessionOpen(db, caller.sessionId);
  };
  const stopWatching = house.news.watch({
    vesselId,
    seq: lastSeen(request.get('Last-Event-ID'), vesselId) ?? query.since ?? row.seq,
    mayStillRead,
    tell(change) {
      response.write(
        `event: change\nid: ${vesselId}:${change.seq}\ndata: ${JSON.stringify({ vesselId, ...change })}\n\n`,
      );
      if (response.writableLength > MOST_WAITING_BYTES) response.destroy();
    },
    end,
  });
  const heartbeat = setInterval(() => {
    response.write(': still here\n\n');
    mayStillRead().then((stillMay) => stillMay || end(), end);
  }, HEARTBEAT_MS);
  response.on('close', () => {
    clearInterval(heartbeat);
    stopWatching();
  });
  return undefined;
});

/** A browser that reconnects says where it was by itself; that is newer than the address it first asked for. */
function lastSeen(lastEventId: string | undefined, vesselId: string): number | undefined {
  const [id, seq] = lastEventId?.split(':') ?? [];
  return id === vesselId && seq !== undefined && /^\d{1,9}$/.test(seq) ? Number(seq) : undefined;
}
