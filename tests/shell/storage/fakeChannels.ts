/** BroadcastChannels of one browser: a message reaches every other channel of the same name, copied, in a later turn. */
export function createFakeChannels() {
  const open = new Set<{ name: string; channel: BroadcastChannel }>();
  const make = (name: string): BroadcastChannel => {
    const channel = {
      onmessage: null as ((event: MessageEvent) => void) | null,
      postMessage(message: unknown) {
        const data: unknown = structuredClone(message);
        for (const other of open)
          if (other.name === name && other.channel !== (channel as unknown))
            setTimeout(() => {
              if (open.has(other)) other.channel.onmessage?.({ data } as MessageEvent);
            });
      },
      close() {
        open.delete(entry);
      },
    };
    const entry = { name, channel: channel as unknown as BroadcastChannel };
    open.add(entry);
    return entry.channel;
  };
  return { make };
}
