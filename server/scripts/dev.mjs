// Development: the server restarts when its source changes, and Vite serves the client with hot reload at port 5173.
import { spawn } from 'node:child_process';

const port = process.env.PORT ?? '3000';
const env = { ...process.env, PORT: port, PUBLIC_URL: 'http://127.0.0.1:5173', API_URL: `http://127.0.0.1:${port}` };
const children = [
  spawn('npx', ['tsx', 'watch', '--clear-screen=false', 'server/main.ts'], { stdio: 'inherit', env }),
  spawn('npx', ['vite'], { stdio: 'inherit', env }),
];
for (const child of children) child.on('exit', () => children.forEach((each) => each.kill('SIGTERM')));
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => children.forEach((each) => each.kill('SIGTERM')));
