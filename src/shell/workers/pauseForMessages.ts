/** A turn of the event loop: what waits in the message queue is let in. Timers would be slowed down to 4 ms a turn. */
export function pauseForMessages(): Promise<void> {
  return new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(null);
  });
}
