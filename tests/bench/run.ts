import { startTestServer } from '../support/test-server';
import { benchBundle } from './bundle';
import { printLines } from './figures';
import { benchIngest } from './ingest';
import { benchPaper } from './paper';
import { benchRecording } from './recording';
import { benchScoring } from './scoring';
import { benchSheets } from './sheets';
import { benchVerdict } from './verdict';

/** Every figure is a ratio to a floor measured in the same run; absolute times are this machine's. */
const server = await startTestServer();
const lines = [...(await benchRecording(server))];
await server.close();
lines.push(...benchVerdict(), ...benchPaper(), ...(await benchScoring()), ...(await benchIngest()), ...(await benchSheets()), ...(await benchBundle()));
process.exit(printLines(lines) ? 0 : 1);
