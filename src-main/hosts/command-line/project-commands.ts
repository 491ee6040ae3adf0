import { join } from 'node:path';
import { wholeNumber, type Command, type CommandTools } from './command.ts';
import { textTable } from './text-table.ts';

const open = (tools: CommandTools, path: string, readOnly = false) => tools.ask('project.open', { path, readOnly });

export const projectCommands: Command[] = [
  {
    name: 'new',
    usage: 'FILE',
    summary: 'makes an empty project',
    examples: ['new review.footing --title "Harbour review"'],
    nPositionals: { min: 1, max: 1 },
    options: { title: { value: 'TITLE', help: 'title of the review; the file name unless given' } },
    async run({ positionals: [path = ''], option }, tools) {
      const view = await tools.ask('project.create', {
        path,
        title: option('title') ?? path.replace(/^.*[\\/]|\.footing$/g, '').slice(0, 200),
      });
      return {
        json: view,
        lines: [view.path, `${view.project.title} · trail ${view.head.sequence} ${view.head.hash}`],
      };
    },
  },
  {
    name: 'demo',
    usage: 'DIR',
    summary: 'unpacks the worked example (invented data) and runs it whole, to a signed report',
    examples: ['demo footing-demo'],
    nPositionals: { min: 1, max: 1 },
    options: {},
    home: ({ positionals: [directory = ''] }) => directory,
    async run({ positionals: [directory = ''] }, tools) {
      const view = await tools.ask('project.openDemo', { directory });
      for (const claim of view.claims) {
        await signDemo(tools, claim.id);
        tools.tell(`Claim ${claim.id}: ${claim.title} — signed.`);
      }
      const { files } = await tools.ask('report.write', {
        directory: join(directory, 'report'),
        formats: ['html', 'json'],
      });
      const check = await tools.ask('project.verify', {});
      const recheck = await tools.ask('project.recheck', {});
      const claims = (await tools.ask('project.view', {})).claims;
      return {
        json: { project: view.path, report: files, claims, verify: check, recheck },
        lines: [
          `Project  ${view.path} (invented data)`,
          ...claims.map(
            (claim) => `Claim ${claim.id}  ${claim.title}: ${claim.status}${claim.isSigned ? ', signed' : ''}`,
          ),
          ...files.map((file) => `Report   ${file}`),
          `Verified ${check.isSound ? 'sound' : 'NOT SOUND'}: ${check.nEntries} entries, head ${check.head.hash}`,
          `Recheck  ${recheck.nResults} results, ${recheck.isIdentical ? 'identical to the last digit' : 'DIFFERENT'}`,
        ],
        status: check.isSound && recheck.isIdentical ? 0 : 1,
      };
    },
  },
  {
    name: 'verify',
    usage: 'FILE',
    summary: 'checks file, trail and signatures; names everything that was altered',
    examples: ['verify review.footing', 'verify review.footing --json'],
    nPositionals: { min: 1, max: 1 },
    options: {},
    async run({ positionals: [path = ''] }, tools) {
      const report = await tools.ask('project.verify', { path });
      const lines = [
        ...report.problems.map(({ code, where, detail }) => `${code}  ${where}: ${detail}`),
        ...report.signatures.map(
          (signature) =>
            `${signature.meaning}  claim ${signature.claimId}, revision ${signature.revision}, ${signature.signer}, key ${signature.fingerprint}: ${signature.isValid ? 'valid' : `INVALID, ${signature.reason ?? ''}`}`,
        ),
        `${report.isSound ? 'Sound' : 'NOT SOUND'}: ${report.nEntries} entries, ${report.nRecords} records, ${report.nContents} contents; head ${report.head.sequence} ${report.head.hash}`,
      ];
      return { json: report, lines, status: report.isSound ? 0 : 1 };
    },
  },
  {
    name: 'recheck',
    usage: 'FILE',
    summary: 'computes every stored result again and lists differences',
    examples: ['recheck review.footing'],
    nPositionals: { min: 1, max: 1 },
    options: {},
    async run({ positionals: [path = ''] }, tools) {
      await open(tools, path, true);
      const report = await tools.ask('project.recheck', {});
      const lines = [
        ...report.differences.map(
          (difference) =>
            `result ${difference.resultId} (${difference.method}, claim ${difference.claimId}) at ${difference.path}: stored ${difference.stored}, now ${difference.recomputed}`,
        ),
        `${report.nResults} results, ${report.isIdentical ? 'identical to the last digit' : `${report.differences.length} different`}`,
      ];
      return { json: report, lines, status: report.isIdentical ? 0 : 1 };
    },
  },
  {
    name: 'trail',
    usage: 'FILE',
    summary: 'lists what was done, by whom and when',
    examples: ['trail review.footing --limit 20'],
    nPositionals: { min: 1, max: 1 },
    options: { limit: { value: 'N', help: 'how many of the newest entries; 50 unless given' } },
    async run(args, tools) {
      const limit = wholeNumber(args, 'limit', { atMost: 500 }) ?? 50;
      await open(tools, args.positionals[0] ?? '', true);
      const { lines: entries } = await tools.ask('trail.list', { limit });
      const rows = entries.map((line) => [
        String(line.sequence),
        line.at,
        line.reviewer.name,
        `${line.action}: ${line.subject}${line.isUndone ? ' (undone)' : ''}`,
        line.hash.slice(0, 12),
      ]);
      return { json: entries, lines: textTable(rows) };
    },
  },
  ...(['undo', 'redo'] as const).map((name): Command => ({
    name,
    usage: 'FILE',
    summary: name === 'undo' ? 'takes back the last change, as an entry of its own' : 'does again what was undone last',
    examples: [`${name} review.footing`],
    nPositionals: { min: 1, max: 1 },
    options: {},
    async run({ positionals: [path = ''] }, tools) {
      const before = await open(tools, path);
      const view = await tools.ask(`trail.${name}`, {});
      return { json: view, lines: [`${name === 'undo' ? 'Undone' : 'Done again'}: ${before[name] ?? ''}`] };
    },
  })),
];

/** The worked example is signed by its invented reviewer, with a key made for it and kept beside it. */
async function signDemo(tools: CommandTools, claimId: number): Promise<void> {
  const { reviewer } = await tools.ask('session.get', {});
  const passphrase = 'worked example, invented';
  if (!reviewer?.publicKey) {
    await tools.ask('reviewer.set', { name: reviewer?.name ?? '', role: reviewer?.role ?? '' });
    await tools.ask('identity.create', { passphrase });
  }
  await tools.ask('finding.sign', {
    claimId,
    passphrase,
    meaning: 'sign-off',
    remark: 'Worked example with invented data.',
  });
}
