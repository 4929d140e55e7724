// Whether the process of this container does its work: the web server is ready, the worker serves its metrics.
const { PORT = '3000', METRICS_PORT, METRICS_TOKEN } = process.env;
const web = `http://127.0.0.1:${PORT}/api/v1/ready`;
const worker = `http://127.0.0.1:${METRICS_PORT}/metrics`;
const headers = METRICS_TOKEN ? { authorization: `Bearer ${METRICS_TOKEN}` } : {};

const response = await fetch(process.argv[2] === 'worker' ? worker : web, { headers, signal: AbortSignal.timeout(4000) });
if (!response.ok) throw new Error(`It answers ${response.status}.`);
