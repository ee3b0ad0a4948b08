import { simpleParser } from 'mailparser';
import { failureOf, type Failure } from './bounces.js';

export interface DeliveryReport {
  /** Addresses the message was sent to, as its headers name them. */
  readonly to: readonly string[];
  /** Undefined where it tells of no failure: another kind of message, or one that did arrive. */
  readonly failure: Failure | undefined;
}

/** Reads a message as a delivery report (RFC 3464). What is none, or is broken, has no failure. */
export async function readDeliveryReport(message: Buffer): Promise<DeliveryReport> {
  const mail = await simpleParser(message, {
    keepDeliveryStatus: true,
    skipHtmlToText: true,
    skipTextToHtml: true,
    skipTextLinks: true,
    skipImageLinks: true,
  });
  const addressed = mail.headerLines
    .filter(({ key }) => ['to', 'delivered-to', 'x-original-to', 'envelope-to'].includes(key))
    .flatMap(({ line }) => line.match(/[^\s<>,:;"]+@[^\s<>,;"]+/g) ?? []);
  const status = mail.attachments.find(({ contentType }) => contentType === 'message/delivery-status');
  return { to: addressed, failure: status && failureIn(status.content.toString('utf8')) };
}

/** The first block is on the message, each further one on a recipient; a failure for good counts before any other. */
function failureIn(report: string): Failure | undefined {
  const [, ...recipients] = report.trim().split(/\r?\n[ \t]*(?:\r?\n[ \t]*)+/);
  const failures = recipients.map(fieldsOf).flatMap((fields) => {
    const action = fields.get('action')?.toLowerCase();
    const status = /^[45]\.\d{1,3}\.\d{1,3}/.exec(fields.get('status') ?? '')?.[0];
    return status !== undefined && (action === 'failed' || action === 'delayed') ? [failureOf(status)] : [];
  });
  return failures.find(({ permanent }) => permanent) ?? failures[0];
}

/** Fields by lower-case name; lines that begin with white space go on with the line before. */
function fieldsOf(block: string): Map<string, string> {
  const lines = block.replace(/\r?\n[ \t]+/g, ' ').split(/\r?\n/);
  return new Map(
    lines.flatMap((line) => {
      const colon = line.indexOf(':');
      return colon < 1 ? [] : [[line.slice(0, colon).trim().toLowerCase(), line.slice(colon + 1).trim()]];
    }),
  );
}
