import type { ReportClaim } from '../contract/project.ts';

/** Signatures over the finding as it stands, not over an earlier revision. */
export function currentSignatures({ finding, signatures }: ReportClaim): ReportClaim['signatures'] {
  return signatures.filter(({ signature }) => signature.revision === finding?.revision);
}

/** A claim is a draft until a valid sign-off covers the finding as it stands. */
export function isDraft(claim: ReportClaim): boolean {
  const signsOff = currentSignatures(claim).some(
    ({ signature, check }) => signature.meaning === 'sign-off' && check.isValid,
  );
  return !(claim.finding?.isSigned === true && signsOff);
}
