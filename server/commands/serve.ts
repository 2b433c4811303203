import { createProxyMiddleware } from 'http-proxy-middleware';
import { readConfig } from '../config/config';
import { startServer } from '../index';

/** For development: the interface from here, every other address from Metro, so that both are one origin. */
const config = readConfig();
const web = config.devWebOrigin ? createProxyMiddleware({ target: config.devWebOrigin, ws: true, changeOrigin: true }) : undefined;
const server = await startServer(config, web ? { web } : {});
console.log(`Meniscus, for development, is at ${server.address}`);

for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void server.stop().then(() => process.exit(0)));
