import { subscribe } from 'node:diagnostics_channel';
import dns from 'node:dns';
import { appendFileSync } from 'node:fs';
import net from 'node:net';

// Loaded before a host (node --import): writes down every name it looks up and every socket it opens, one a line.
const file = process.env.CROSSTRACK_SOCKET_LOG ?? '';
const write = (line) => appendFileSync(file, `${line}\n`);

write('watching');
const { connect } = net.Socket.prototype;
net.Socket.prototype.connect = function (...args) {
  const [first] = args.flat();
  write(`connect ${JSON.stringify(first)}`);
  return connect.apply(this, args);
};
for (const name of ['lookup', 'resolve', 'resolve4', 'resolve6']) {
  const ask = dns[name];
  dns[name] = (hostname, ...rest) => {
    write(`${name} ${hostname}`);
    return ask(hostname, ...rest);
  };
}
subscribe('udp.socket', () => write('udp'));
