import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Meilisearch, type Index, type Settings } from 'meilisearch';
import { createSearchServer, type SearchServer } from '../../../server/local/search/search-server.js';

export const masterKey = 'a master key for tests';

export type Documents = Record<string, unknown>[];

/** One local search server on a free port, with a folder of its own. */
export class SearchUnderTest {
  readonly errors: unknown[] = [];
  private readonly folder = mkdtempSync(join(tmpdir(), 'search-stand-in-'));
  private server!: SearchServer;
  private listener!: Server;
  address = '';

  static async started(): Promise<SearchUnderTest> {
    const search = new SearchUnderTest();
    await search.start();
    return search;
  }

  /** A client that may do everything, or what the key given allows. */
  client(apiKey: string | undefined = masterKey): Meilisearch {
    return new Meilisearch({ host: this.address, ...(apiKey === '' ? {} : { apiKey }) });
  }

  /** An index with these settings and documents, ready to be searched. */
  async index(uid: string, documents: Documents, settings: Settings = {}): Promise<Index> {
    const index = this.client().index(uid);
    await index.updateSettings(settings).waitTask();
    const task = await index.addDocuments(documents, { primaryKey: 'id' }).waitTask();
    if (task.status !== 'succeeded') throw new Error(JSON.stringify(task.error));
    return index;
  }

  /** A plain request, for what the SDK would not send. */
  async send(method: string, path: string, body?: string, headers: Record<string, string> = {}) {
    const response = await fetch(this.address + path, {
      method,
      headers: { authorization: `Bearer ${masterKey}`, 'content-type': 'application/json', ...headers },
      ...(body === undefined ? {} : { body }),
    });
    const text = await response.text();
    return {
      status: response.status,
      body: (text === '' ? undefined : JSON.parse(text)) as Record<string, unknown>,
    };
  }

  async restart(): Promise<void> {
    await this.halt();
    await this.start();
  }

  async stop(): Promise<void> {
    await this.halt();
    rmSync(this.folder, { recursive: true, force: true });
  }

  private async start(): Promise<void> {
    this.server = createSearchServer({
      dataDir: this.folder,
      masterKey,
      onError: (error) => this.errors.push(error),
    });
    this.listener = this.server.app.listen(0, '127.0.0.1');
    await once(this.listener, 'listening');
    this.address = `http://127.0.0.1:${(this.listener.address() as AddressInfo).port}`;
  }

  private async halt(): Promise<void> {
    this.listener.close();
    this.listener.closeAllConnections();
    await this.server.close();
  }
}

/** Identifiers of hits in their order. */
export const idsOf = (result: { hits: Record<string, unknown>[] }) => result.hits.map((hit) => hit['id']);

/** The protocol's error code and the status of a refused call. */
export async function refusalOf(call: Promise<unknown>): Promise<{ status: number; code: string }> {
  try {
    await call;
  } catch (error) {
    const { response, cause } = error as { response: Response; cause: { code: string } };
    return { status: response.status, code: cause.code };
  }
  throw new Error('The call was not refused');
}
