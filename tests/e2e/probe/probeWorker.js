// Tries each way a worker has to reach another origin, and tells which succeeded.
const outcome = (promise) =>
  promise.then(
    () => 'reached',
    () => 'refused',
  );

function trySocket(address) {
  return new Promise((resolve, reject) => {
    const socket = new WebSocket(address);
    socket.onopen = resolve;
    socket.onerror = reject;
  });
}

async function tryEvents(address) {
  const source = new EventSource(address);
  await new Promise((resolve, reject) => {
    source.onopen = resolve;
    source.onerror = reject;
  });
  source.close();
}

self.onmessage = async ({ data }) => {
  postMessage({
    fetch: await outcome(fetch(`${data.http}/fetch`)),
    socket: await outcome((async () => trySocket(data.socket))()),
    events: await outcome((async () => tryEvents(`${data.http}/events`))()),
    importScripts: await outcome((async () => importScripts(`${data.http}/script.js`))()),
  });
};
