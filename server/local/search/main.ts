import { createSearchServer } from './search-server.js';

const {
  SEARCH_PORT = '4312',
  SEARCH_HOST = '127.0.0.1',
  SEARCH_DATA = 'data/search',
  SEARCH_MASTER_KEY,
} = process.env;

const port = Number(SEARCH_PORT);
if (!Number.isInteger(port) || port < 0 || port > 65535) {
  throw new Error(`SEARCH_PORT must be a port number from 0 to 65535, it is "${SEARCH_PORT}".`);
}

const search = createSearchServer({
  dataDir: SEARCH_DATA,
  masterKey: SEARCH_MASTER_KEY,
  onError: (error) => console.error(error),
});

const listener = search.app.listen(port, SEARCH_HOST, (error?: Error) => {
  if (error) {
    console.error(`Search cannot listen on ${SEARCH_HOST}:${port}: ${error.message}`);
    process.exit(1);
  }
  const address = listener.address();
  const heard = typeof address === 'object' && address ? address.port : port;
  console.log(`Search listens on http://${SEARCH_HOST}:${heard}`);
});

let isStopping = false;
const stop = () => {
  if (isStopping) return;
  isStopping = true;
  listener.close();
  listener.closeAllConnections();
  void search.close().then(() => process.exit(0));
};
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
