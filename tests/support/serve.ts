import { readConfig } from '../../server/config/config';
import { startServer } from '../../server/index';

/** The real server in a process of its own, for tests that end it without warning. Its address is the first line it writes. */
const server = await startServer(readConfig());
process.stdout.write(`${server.address}\n`);
process.on('SIGTERM', () => void server.stop().then(() => process.exit(0)));
