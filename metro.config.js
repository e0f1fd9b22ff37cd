/**
 * Metro bundles the client. Folders of the server are invisible to it, so that an import which breaks the layering breaks the build;
 * `server/contract` is the one part of the server that the client shares. In development /api is passed on to the Express server.
 */
const { readdirSync } = require('node:fs');
const http = require('node:http');
const path = require('node:path');
const { getDefaultConfig } = require('expo/metro-config');

const config = getDefaultConfig(__dirname);

const closed = ['.ci', '.git', '.pickglass', 'db', 'dist', 'dist-server', 'drizzle', 'recon', 'tests', 'workers'];
const closedInServer = readdirSync(path.join(__dirname, 'server')).filter((name) => name !== 'contract');
const paths = [...closed, ...closedInServer.map((name) => path.join('server', name))];
const escape = (text) => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
// Anchored at the project: a package in node_modules may have a folder called `dist` or `db`.
const blocked = paths.map((name) => new RegExp(`^${escape(path.join(__dirname, name))}(${escape(path.sep)}|$)`));
config.resolver.blockList = blocked.concat(config.resolver.blockList ?? []);

/** Sends a request on to the server of `npm run dev`, and its answer back, as streams: uploads and events pass through. */
function passOn(target, request, response) {
  const { method, headers, url } = request;
  const upstream = http.request({ host: target.hostname, port: target.port, path: url, method, headers }, (answer) => {
    response.writeHead(answer.statusCode ?? 502, answer.headers);
    answer.pipe(response);
  });
  upstream.on('error', (error) => {
    if (!response.headersSent) response.writeHead(502, { 'Content-Type': 'text/plain' });
    response.end(`The API server at ${target.origin} does not answer: ${error.message}\n`);
  });
  response.on('close', () => upstream.destroy());
  request.pipe(upstream);
}

if (process.env.PICKGLASS_API !== undefined) {
  const target = new URL(process.env.PICKGLASS_API);
  const previous = config.server.enhanceMiddleware;
  config.server.enhanceMiddleware = (middleware, server) => {
    const inner = previous ? previous(middleware, server) : middleware;
    return (request, response, next) =>
      request.url?.startsWith('/api/') ? passOn(target, request, response) : inner(request, response, next);
  };
}

module.exports = config;
