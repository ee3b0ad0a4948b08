import { Router } from 'express';
import type { IndexState } from '../storage/index-catalogue.js';
import { matchesIndex } from './access.js';
import { indexInPath, type Surroundings } from './surroundings.js';

/** The version of the protocol spoken; the engine behind it is ours. */
const spoken = '1.30.0';

/** Health, version and figures. */
export function systemRoutes(around: Surroundings): Router {
  const router = Router();

  router.get('/health', (_request, response) => {
    around.catalogue.reader.first('SELECT 1 AS one');
    response.json({ status: 'available' });
  });

  router.get('/version', (request, response) => {
    around.access.caller(request, 'version');
    response.json({ commitSha: 'local', commitDate: '2026-01-01T00:00:00Z', pkgVersion: spoken });
  });

  router.get('/stats', (request, response) => {
    const caller = around.access.caller(request, 'stats.get');
    const indexes = around.catalogue
      .list()
      .filter(({ uid }) => caller.indexes.some((each) => matchesIndex(each, uid)));
    const size = fileSize(around);
    response.json({
      databaseSize: size,
      usedDatabaseSize: size,
      lastUpdate: around.tasks.lastFinished(),
      indexes: Object.fromEntries(indexes.map((index) => [index.uid, figures(around, index)])),
    });
  });

  router.get('/indexes/:uid/stats', (request, response) => {
    response.json(figures(around, indexInPath(around, request, 'stats.get').index));
  });

  return router;
}

function figures(around: Surroundings, index: IndexState) {
  const { reader } = around.catalogue;
  const table = `documents_${index.id}`;
  const totals = reader.first<{ documents: number; size: number | null }>(
    `SELECT count(*) AS documents, sum(length(body)) AS size FROM ${table}`,
  );
  const fields = reader.all<{ field: string; documents: number }>(
    `SELECT j.key AS field, count(*) AS documents FROM ${table}, json_each(body) j GROUP BY j.key ORDER BY j.key`,
  );
  const { documents = 0, size = 0 } = totals ?? {};
  return {
    numberOfDocuments: documents,
    rawDocumentDbSize: size ?? 0,
    avgDocumentSize: documents === 0 ? 0 : Math.round((size ?? 0) / documents),
    indexSize: size ?? 0,
    usedIndexSize: size ?? 0,
    isIndexing: around.tasks.isBusy(index.uid),
    numberOfEmbeddings: 0,
    numberOfEmbeddedDocuments: 0,
    fieldDistribution: Object.fromEntries(fields.map((row) => [row.field, row.documents])),
  };
}

function fileSize(around: Surroundings): number {
  const { reader } = around.catalogue;
  const pages = reader.first<{ page_count: number }>('PRAGMA page_count')?.page_count ?? 0;
  return pages * (reader.first<{ page_size: number }>('PRAGMA page_size')?.page_size ?? 0);
}
