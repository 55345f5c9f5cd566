const name = 'evenload';

/** Tells the other tabs of this device that a campaign has grown; '' when the list of campaigns has. */
export function tellOthers(campaign: string): void {
  if (!('BroadcastChannel' in globalThis)) return;
  const channel = new BroadcastChannel(name);
  channel.postMessage({ campaign });
  channel.close();
}

/** Calls back when another tab has written to the campaign (any, when null). Returns how to stop. */
export function whenOthersWrite(campaign: string | null, then: () => void): () => void {
  if (!('BroadcastChannel' in globalThis)) return () => undefined;
  const channel = new BroadcastChannel(name);
  channel.onmessage = (event: MessageEvent<{ campaign: string }>) => {
    if (campaign === null || event.data.campaign === campaign) then();
  };
  return () => channel.close();
}
