import { setTimeout as pause } from 'node:timers/promises';
import { Client } from 'pg';
import { connectionSettings } from '../connection-settings.ts';
import type { NoticeTopic } from '../sql-door.ts';
import { noticeChannel } from './send-notices.ts';

export type NoticeBoardOptions = {
  readonly connectionString: string;
  readonly applicationName: string;
  readonly onConnectionFault?: (error: Error) => void;
};

/**
 * Where to wait for news. Notices are wake-ups and may be lost: first watch, then look into the database, then wait.
 */
export type NoticeBoard = {
  /** Resolves once the board listens for the first time. */
  ready(): Promise<void>;
  /**
   * Be called at every notice about this id, or about any with `*`, and after every reconnect, when something may have been missed.
   *
   * @returns stops the watch
   */
  watch(topic: NoticeTopic, id: string, onNotice: (id: string) => void): () => void;
  close(): Promise<void>;
};

type Watcher = { readonly topic: string; readonly id: string; readonly onNotice: (id: string) => void };

const reconnectMilliseconds = 250;

/** Listen on a client of its own, and again after every loss, until it is closed. One board a process is enough. */
export function openNoticeBoard(options: NoticeBoardOptions): NoticeBoard {
  const watchers = new Set<Watcher>();
  const closing = new AbortController();
  let running: Promise<void> = Promise.resolve();
  const listening = new Promise<void>((resolve) => {
    running = keepListening(options, watchers, closing.signal, resolve);
  });
  return {
    ready: () => listening,
    watch: (topic, id, onNotice) => {
      const watcher = { topic, id, onNotice };
      watchers.add(watcher);
      return () => watchers.delete(watcher);
    },
    close: () => {
      closing.abort();
      return running;
    },
  };
}

async function keepListening(
  options: NoticeBoardOptions,
  watchers: ReadonlySet<Watcher>,
  closing: AbortSignal,
  onListening: () => void,
): Promise<void> {
  const closed = new Promise<void>((resolve) => {
    closing.addEventListener('abort', () => resolve(), { once: true });
  });
  while (!closing.aborted) {
    const client = new Client(connectionSettings(options));
    client.on('notification', ({ payload = '' }) => tell(watchers, payload));
    try {
      await Promise.race([closed, listenUntilLost(client, watchers, onListening)]);
    } catch (error) {
      if (!closing.aborted) options.onConnectionFault?.(error instanceof Error ? error : new Error(String(error)));
    }
    await client.end().catch(() => {}); // It may never have been connected.
    // An abort ends the pause early, and the loop with it.
    await pause(reconnectMilliseconds, undefined, { signal: closing }).catch(() => {});
  }
}

/** Ends with an error only: a connection that listens has no other way to end. */
async function listenUntilLost(client: Client, watchers: ReadonlySet<Watcher>, onListening: () => void): Promise<void> {
  const lost = new Promise<never>((_, reject) => {
    client.on('error', reject);
    client.on('end', () => reject(new Error('the connection of the notice board ended')));
  });
  lost.catch(() => {}); // Heard below; this keeps a loss during `connect` from counting as unhandled.
  await client.connect();
  await client.query(`listen ${noticeChannel}`);
  onListening();
  for (const watcher of watchers) watcher.onNotice(watcher.id);
  await lost;
}

function tell(watchers: ReadonlySet<Watcher>, payload: string): void {
  const colon = payload.indexOf(':');
  const topic = payload.slice(0, colon);
  const id = payload.slice(colon + 1);
  for (const watcher of watchers) {
    if (watcher.topic === topic && (watcher.id === id || watcher.id === '*')) watcher.onNotice(id);
  }
}
