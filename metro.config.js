import { createRequire } from 'node:module';

// NOTE Metro loads this file as an ES module; expo/metro-config is CommonJS.
const require = createRequire(import.meta.url);
const { getDefaultConfig } = require('expo/metro-config');

const config = getDefaultConfig(import.meta.dirname);
const root = import.meta.dirname.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');

// A wrong import of these rooms fails the bundle instead of shipping server code to a browser.
const closedRooms = ['server', 'db', 'tests', 'uploads'].map((room) => new RegExp(`^${root}/${room}/.*`));
config.resolver.blockList = [...[config.resolver.blockList ?? []].flat(), ...closedRooms];

export default config;
