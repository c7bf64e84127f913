import { pino } from 'pino';
import { readConfig } from '#server/config/config.ts';
import { openDatabase } from '#server/db/database.ts';
import { pages } from '#server/db/schema/index.ts';
import { announceBy } from '#server/jobs/queue.ts';
import { pipeline } from '#server/pipeline.ts';

/**
 * Makes again what follows from the facts: queues every page that has a document for the search index, and every page
 * that has no picture for drawing. The server does the work when it next runs; stop it first, or restart it after.
 */
const log = pino();
const { db, close } = openDatabase(readConfig(process.env).dataDir);
const announce = announceBy(pipeline);
let queued = 0;
db.transaction((tx) => {
  for (const { id, manualId, revision, drawnKey, position } of tx.select().from(pages).all()) {
    if (revision > 0) announce(tx, 'revision.saved', { subjectId: id, manualId });
    if (drawnKey === null) announce(tx, 'page.added', { subjectId: id, manualId, place: position });
    queued += 1;
  }
});
close();
log.info({ pages: queued }, 'queued; the server works them off when it runs');
