/**
 * Loaded into a process before anything else (`NODE_OPTIONS=--import=…`), and so into its workers and children: writes
 * down, in the file that FOOTING_TRIPWIRE names, that it is armed, and then every attempt to look up a name, to open a
 * socket to anything but this machine, or to listen on anything but 127.0.0.1. Each attempt fails.
 */
import dgram from 'node:dgram';
import dns from 'node:dns';
import { appendFileSync } from 'node:fs';
import { syncBuiltinESMExports } from 'node:module';
import net from 'node:net';
import { isMainThread } from 'node:worker_threads';

const file = process.env['FOOTING_TRIPWIRE'] ?? '';
const write = (line: string) => appendFileSync(file, `${line}\n`);

function refuse(what: string): never {
  write(`tried: ${what}`);
  throw new Error(`The network was tried: ${what}`);
}

const isThisMachine = (host: string) => host === '::1' || /^127\.\d+\.\d+\.\d+$/.test(host);

const { connect } = net.Socket.prototype;
net.Socket.prototype.connect = function (this: net.Socket, ...values: unknown[]) {
  // Callers inside Node hand the arguments over as one array, already in order.
  const [first, second] = (Array.isArray(values[0]) ? values[0] : values) as unknown[];
  const { host, path } = (typeof first === 'object' && first !== null ? first : {}) as {
    host?: string;
    path?: unknown;
  };
  const target = host ?? (typeof second === 'string' ? second : 'localhost');
  const isLocal = typeof path === 'string' || target === 'localhost' || isThisMachine(target);
  if (!isLocal) refuse(`a connection to ${target}`);
  return Reflect.apply(connect, this, values) as net.Socket;
};

const { listen } = net.Server.prototype;
net.Server.prototype.listen = function (this: net.Server, ...values: unknown[]) {
  const [first, second] = values;
  const host = typeof first === 'object' && first !== null ? (first as { host?: string }).host : second;
  if (host !== '127.0.0.1') refuse(`listening on ${typeof host === 'string' ? host : 'every interface'}`);
  return Reflect.apply(listen, this, values) as net.Server;
} as typeof listen;

for (const [folder, functions] of Object.entries({ dns, 'dns.promises': dns.promises })) {
  const table = functions as unknown as Record<string, unknown>;
  for (const name of Object.keys(table).filter((key) => /^(lookup|resolve|reverse)/.test(key))) {
    const original = table[name] as (...values: unknown[]) => unknown;
    table[name] = (...values: unknown[]) => {
      // An address is its own answer; nobody is asked.
      if (name === 'lookup' && net.isIP(String(values[0])) !== 0) return original(...values);
      return refuse(`${folder}.${name} of ${String(values[0])}`);
    };
  }
}
dgram.createSocket = () => refuse('a datagram socket');

syncBuiltinESMExports();
write(isMainThread ? 'armed: main thread' : 'armed: worker thread');
