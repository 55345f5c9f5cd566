const name = 'evenload';

/**
 * Tells the other tabs of this device, and whoever else listens in this one, that a campaign has grown; '' when the list of
 * campaigns has.
 * @param from a word of the teller's own, who need not be told
 */
export function tellOthers(campaign: string, from = ''): void {
  if (!('BroadcastChannel' in globalThis)) return;
  const channel = new BroadcastChannel(name);
  channel.postMessage({ campaign, from });
  channel.close();
}

/** Calls back when somebody else has written to the campaign (any, when null). Returns how to stop. */
export function whenOthersWrite(campaign: string | null, then: () => void, self: string | null = null): () => void {
  if (!('BroadcastChannel' in globalThis)) return () => undefined;
  const channel = new BroadcastChannel(name);
  channel.onmessage = (event: MessageEvent<{ campaign: string; from: string }>) => {
    if (self !== null && event.data.from === self) return;
    if (campaign === null || event.data.campaign === campaign) then();
  };
  return () => channel.close();
}
