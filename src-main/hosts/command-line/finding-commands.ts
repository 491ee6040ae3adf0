import { cautions } from '../../contract/cautions.ts';
import { conclusion, signatureMeaning } from '../../contract/finding.ts';
import { fillIn } from '../../handlers/fill-in.ts';
import { badUsage, claimNumber, claimOption, CommandFailure, oneOf, type Command } from './command.ts';

const formats = ['html', 'json'] as const;

export const findingCommands: Command[] = [
  {
    name: 'finding',
    usage: 'FILE',
    summary: 'writes the finding on a claim; figures in braces, {recomputed}, are filled in',
    examples: ['finding review.footing --claim 1 --conclusion "not supported" --text "The line gives {recomputed}."'],
    nPositionals: { min: 1, max: 1 },
    options: {
      ...claimOption,
      conclusion: { value: 'C', help: conclusion.options.join(' · ') },
      text: { value: 'TEXT', help: 'the finding in words' },
      conditions: { value: 'TEXT', help: 'conditions on which the number is supported' },
      published: { value: 'ID', help: 'published range to quote; may be repeated', isRepeatable: true },
    },
    async run(args, tools) {
      await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      const claimId = await claimNumber(args, tools);
      const { findings } = await tools.ask('claim.view', { claimId });
      const earlier = findings.at(-1);
      const chosen = oneOf(args, 'conclusion', conclusion.options) ?? earlier?.conclusion;
      if (!chosen) throw badUsage('--conclusion', `one of ${conclusion.options.join(', ')}`, 'none');
      const view = await tools.ask('finding.save', {
        claimId,
        conclusion: chosen,
        text: args.option('text') ?? earlier?.text ?? '',
        conditions: args.option('conditions') ?? earlier?.conditions ?? '',
        publishedValueIds: args.has('published') ? args.options('published') : (earlier?.publishedValueIds ?? []),
      });
      const finding = view.findings.at(-1);
      for (const caution of cautions) tools.tell(`caution: ${caution}`);
      const { unknown } = fillIn(finding?.text ?? '', view.fillIns);
      if (unknown.length > 0) {
        tools.tell(
          `No figure is called {${unknown.join('}, {')}}. There are: ${Object.keys(view.fillIns).join(', ')}.`,
        );
      }
      return { json: finding, lines: [`claim ${claimId}, revision ${finding?.revision ?? 1}: ${chosen}`] };
    },
  },
  {
    name: 'sign',
    usage: 'FILE',
    summary: 'signs the finding with the reviewer’s key and freezes it; makes the key at the first need',
    examples: ['sign review.footing --claim 1', 'sign review.footing --claim 1 --meaning counter-signature'],
    nPositionals: { min: 1, max: 1 },
    options: {
      ...claimOption,
      meaning: { value: 'M', help: signatureMeaning.options.join(', ') },
      remark: { value: 'TEXT', help: 'a remark that is signed with it' },
    },
    async run(args, tools) {
      const meaning = oneOf(args, 'meaning', signatureMeaning.options) ?? 'sign-off';
      await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      const claimId = await claimNumber(args, tools);
      const request = { claimId, meaning, remark: args.option('remark') ?? '' };
      const { reviewer } = await tools.ask('session.get', {});
      const isNew = !reviewer?.publicKey;
      if (isNew) {
        // A finding that cannot be signed is refused before a key is made for it.
        const answer = await tools.tryAsk('finding.sign', { ...request, passphrase: '' });
        if (!answer.ok && answer.error.code !== 'no-key') throw new CommandFailure(answer.error);
      }
      const passphrase = await tools.passphrase(isNew);
      if (isNew) {
        const made = await tools.ask('identity.create', { passphrase });
        tools.tell(`Made a signing key: ${made.fingerprint ?? ''}`);
      }
      const view = await tools.ask('finding.sign', { ...request, passphrase });
      const signature = view.signatures.at(-1);
      const check = view.signatureChecks.at(-1);
      return {
        json: signature,
        lines: [
          `${meaning} on claim ${claimId}, revision ${signature?.revision ?? ''}, by ${signature?.signer.name ?? ''}`,
          `key ${check?.fingerprint ?? ''}`,
          `witnessing trail ${signature?.trailSequence ?? ''} ${signature?.trailHash ?? ''}`,
        ],
      };
    },
  },
  {
    name: 'revise',
    usage: 'FILE',
    summary: 'starts a new revision of a signed finding, saying what changes and why',
    examples: ['revise review.footing --claim 1 --reason "The provider corrected 1998."'],
    nPositionals: { min: 1, max: 1 },
    options: { ...claimOption, reason: { value: 'TEXT', help: 'what changes and why' } },
    async run(args, tools) {
      const reason = args.option('reason');
      if (!reason) throw badUsage('--reason', 'what changes and why', 'nothing');
      await tools.ask('project.open', { path: args.positionals[0] ?? '' });
      const claimId = await claimNumber(args, tools);
      const view = await tools.ask('finding.revise', { claimId, reason });
      const finding = view.findings.at(-1);
      return { json: finding, lines: [`claim ${claimId}: revision ${finding?.revision ?? ''} begun`] };
    },
  },
  {
    name: 'report',
    usage: 'FILE',
    summary: 'writes the report',
    examples: ['report review.footing --out report', 'report review.footing --out report --format html,json'],
    nPositionals: { min: 1, max: 1 },
    options: {
      out: { value: 'DIR', help: 'folder to write into' },
      format: { value: 'LIST', help: 'html, json; html unless given. A PDF comes from printing the HTML in a browser' },
    },
    async run(args, tools) {
      const directory = args.option('out');
      if (!directory) throw badUsage('--out', 'a folder to write into', 'none');
      const wanted = (args.option('format') ?? 'html').split(',');
      const known = formats.filter((format) => wanted.includes(format));
      const unknown = wanted.filter((format) => !(formats as readonly string[]).includes(format));
      if (unknown.length > 0)
        throw badUsage(
          '--format',
          formats.join(' or '),
          unknown.join(', '),
          'Print the HTML report in a browser for a PDF.',
        );
      await tools.ask('project.open', { path: args.positionals[0] ?? '', readOnly: true });
      const { files } = await tools.ask('report.write', { directory, formats: known });
      return { json: files, lines: files };
    },
  },
];
