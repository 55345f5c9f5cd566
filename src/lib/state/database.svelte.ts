import { Connection } from '#lib/storage/connection.ts';

/** What happened to the way to the database, for whoever shows it. */
export type DatabaseNews = 'blocked' | 'superseded' | 'terminated' | 'data-loss';

let news = $state<DatabaseNews | null>(null);

export const databaseNews = {
  get current(): DatabaseNews | null {
    return news;
  },
  clear(): void {
    news = null;
  }
};

/** The one connection of this tab. */
export const connection = new Connection({
  onBlocked: () => (news = 'blocked'),
  onSuperseded: () => (news = 'superseded'),
  onTerminated: () => (news = 'terminated'),
  onDataLoss: () => (news = 'data-loss')
});
