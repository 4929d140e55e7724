import fs from 'node:fs';
import path from 'node:path';
import { DockerfileParser, type Copy, type From, type JSONInstruction } from 'dockerfile-ast';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { z } from 'zod';
import { listVariables } from '@/lib/env';

const root = path.resolve(import.meta.dirname, '../../..');
const read = (file: string) => fs.readFileSync(path.join(root, file), 'utf8');
const text = z.string();

const serviceSchema = z.looseObject({
  image: text,
  build: z.strictObject({ context: text, dockerfile: text, target: text }).optional(),
  restart: text,
  command: z.array(text).optional(),
  environment: z.record(text, text).default({}),
  ports: z.array(text).default([]),
  volumes: z.array(text).default([]),
  depends_on: z.record(text, z.strictObject({ condition: text })).default({}),
  healthcheck: z.looseObject({ disable: z.boolean().optional(), test: z.array(text).optional() }),
  deploy: z.strictObject({ resources: z.strictObject({ limits: z.strictObject({ cpus: text, memory: text }) }) }),
});
const compose = z.looseObject({ services: z.record(text, serviceSchema), volumes: z.record(text, z.null()) })
  .parse(parse(read('docker/compose.yaml'), { merge: true }));
const services = Object.entries(compose.services);
const oneShot = ['bucket', 'migrate', 'backup'];

const dockerfile = DockerfileParser.parse(read('docker/Dockerfile'));
const instructions = dockerfile.getInstructions();
const stages = dockerfile.getFROMs().map((from: From) => ({ from, name: from.getBuildStage() ?? '', lines: instructions.filter((line) => dockerfile.getContainingImage(line.getRange().start)?.contains(from.getRange().start)) }));
const argumentsOf = (keyword: string) => instructions.filter((line) => line.getKeyword() === keyword);

/** What the image of a stage is made of: its own lines and those of the stages it begins with. */
function linesOf(name: string): ReturnType<typeof dockerfile.getInstructions> {
  const stage = stages.find((one) => one.name === name);
  if (!stage) return [];
  return [...linesOf(stage.from.getImage() ?? ''), ...stage.lines];
}

describe('docker/compose.yaml', () => {
  const variables = listVariables();

  it.each(['web', 'worker'])('sets every variable of the environment for %s, and no other', (name) => {
    const known = variables.filter(({ isForCommands }) => !isForCommands).map((variable) => variable.name);
    expect(Object.keys(compose.services[name]?.environment ?? {}).sort()).toEqual(known.sort());
  });

  it('sets none that has no meaning to be read on the production page', () => {
    expect(variables.filter(({ meaning }) => !/^[A-Z].*\.$/.test(meaning)).map(({ name }) => name)).toEqual([]);
  });

  it.each(oneShot)('hands %s no variable that nothing reads', (name) => {
    const known = variables.map((variable) => variable.name);
    expect(Object.keys(compose.services[name]?.environment ?? {}).filter((variable) => !known.includes(variable))).toEqual([]);
  });

  it.each(services)('%s: a pinned image, limits, and a check of its health', (name, service) => {
    expect(service.image).toMatch(/^[\w./-]+:(?!latest)[\w.-]*\d[\w.-]*$/);
    expect(service.restart).toBe(oneShot.includes(name) ? 'no' : 'unless-stopped');
    if (oneShot.includes(name)) expect(service.healthcheck.disable).toBe(true);
    else expect(service.healthcheck.test?.[0]).toMatch(/^CMD/);
    for (const port of service.ports) expect(port).toMatch(/^127\.0\.0\.1:\d+:\d+$/);
  });

  it('waits for what is there, and mounts only volumes it declares and files that exist', () => {
    for (const [, service] of services) {
      for (const needed of Object.keys(service.depends_on)) expect(Object.keys(compose.services)).toContain(needed);
      for (const volume of service.volumes) {
        const source = volume.split(':')[0] ?? '';
        if (source.startsWith('./')) expect(fs.existsSync(path.join(root, 'docker', source)), source).toBe(true);
        else if (!source.startsWith('$')) expect(Object.keys(compose.volumes)).toContain(source);
      }
    }
  });

  it('builds targets of the Dockerfile, and holds no secret', () => {
    for (const [, { build, environment }] of services) {
      if (build) expect(stages.map(({ name }) => name)).toContain(build.target);
      for (const [name, value] of Object.entries(environment)) if (/PASSWORD|SECRET|TOKEN|_URL$/.test(name)) expect(value.replace(/\$\{[^}]*\}/g, '')).not.toMatch(/:\/\/[^@/]*:[^@/]+@|^\w{8,}$/);
    }
  });

  it('is told every variable it demands by the example', () => {
    const demanded = [...read('docker/compose.yaml').matchAll(/\$\{(\w+):\?/g)].map(([, name]) => name);
    for (const name of new Set(demanded)) expect(read('docker/compose.env.example')).toMatch(new RegExp(`^${name}=$`, 'm'));
  });

  it('gives a stopping web process longer than it takes', () => {
    const drain = Number(/DRAIN_SECONDS:-(\d+)/.exec(compose.services.web?.environment.DRAIN_SECONDS ?? '')?.[1]);
    expect(parseInt(text.parse(compose.services.web?.stop_grace_period))).toBeGreaterThanOrEqual(drain + 2);
  });
});

describe('docker/Dockerfile', () => {
  it('begins from images of one version, the one of package.json', () => {
    const bases = stages.map(({ from }) => from.getImage() ?? '').filter((image) => !stages.some(({ name }) => name === image));
    expect([...new Set(bases)]).toEqual(['node:20.20.2-bookworm-slim']);
  });

  it('copies only what is in the repository or was built, and nothing that .dockerignore leaves out', () => {
    const ignore = read('.dockerignore').split('\n');
    for (const copy of argumentsOf('COPY') as Copy[]) {
      const from = copy.getFlags().find((flag) => flag.getName() === 'from')?.getValue();
      const sources = copy.getArguments().slice(0, -1).map((argument) => argument.getValue());
      if (from !== undefined) {
        expect(stages.map(({ name }) => name)).toContain(from);
        continue;
      }
      for (const source of sources) {
        expect(fs.existsSync(path.join(root, source)), source).toBe(true);
        expect(ignore).toContain(`!${source}`);
      }
    }
  });

  it.each(['web', 'worker', 'mail'])('%s: not root, a health check, an init process, signals that reach it', (name) => {
    const lines = linesOf(name);
    const last = (keyword: string) => lines.filter((line) => line.getKeyword() === keyword).at(-1);
    expect(last('USER')?.getArguments()[0]?.getValue()).toBe('node');
    expect(last('HEALTHCHECK')?.getArguments().map((argument) => argument.getValue()).join(' ')).toContain('CMD');
    expect((last('ENTRYPOINT') as JSONInstruction).getJSONStrings().map((each) => each.getJSONValue())).toEqual(['tini', '--']);
    expect((last('CMD') as JSONInstruction).getJSONStrings()[0]?.getJSONValue()).toBe('node');
    const afterUser = lines.slice(lines.findLastIndex((line) => line.getKeyword() === 'USER'));
    expect(afterUser.some((line) => line.getKeyword() === 'RUN')).toBe(false);
  });

  it('sets no variable that holds a secret', () => {
    for (const line of [...argumentsOf('ENV'), ...argumentsOf('ARG')]) expect(line.getArguments().map((argument) => argument.getValue()).join(' ')).not.toMatch(/PASSWORD|SECRET|TOKEN/);
  });
});
