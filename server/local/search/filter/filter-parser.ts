import { FilterSyntaxError, filterTokens, type FilterToken } from './filter-tokens.js';

export type Comparison = '=' | '!=' | '>' | '>=' | '<' | '<=';

export type Condition =
  | { readonly test: 'compare'; readonly field: string; readonly sign: Comparison; readonly value: string }
  | { readonly test: 'between'; readonly field: string; readonly from: string; readonly to: string }
  | { readonly test: 'in'; readonly field: string; readonly values: readonly string[] }
  | { readonly test: 'exists' | 'null' | 'empty'; readonly field: string }
  | { readonly test: 'startsWith'; readonly field: string; readonly value: string };

export type Filter =
  | { readonly all: readonly Filter[] }
  | { readonly any: readonly Filter[] }
  | { readonly not: Filter }
  | Condition;

const keywords = new Set([
  'AND',
  'OR',
  'NOT',
  'IN',
  'TO',
  'EXISTS',
  'IS',
  'NULL',
  'EMPTY',
  'STARTS',
  'WITH',
  'CONTAINS',
]);
const comparisons = new Set<string>(['=', '!=', '>', '>=', '<', '<=']);
const deepest = 200;
const mostTokens = 40_000;

/**
 * Reads a filter: comparisons, `a 1 TO 5`, `a IN [x, y]`, `EXISTS`, `IS [NOT] NULL`, `IS [NOT] EMPTY`,
 * `STARTS WITH`; NOT binds before AND, AND before OR. Throws FilterSyntaxError saying what was expected and where.
 */
export function parseFilter(source: string): Filter | undefined {
  const tokens = filterTokens(source);
  if (tokens.length > mostTokens) throw new FilterSyntaxError('The filter is too long.');
  if (tokens.length === 0) return undefined;
  const parser = new Parser(source, tokens);
  return parser.whole();
}

class Parser {
  private next = 0;
  private depth = 0;

  constructor(
    private readonly source: string,
    private readonly tokens: readonly FilterToken[],
  ) {}

  whole(): Filter {
    const filter = this.any();
    if (this.peek()) this.refuse('Found unexpected characters at the end of the filter');
    return filter;
  }

  private any(): Filter {
    if (++this.depth > deepest) this.refuse('The filter exceeded the maximum depth limit');
    const any = [this.all()];
    while (this.takeKeyword('OR')) any.push(this.all());
    this.depth--;
    return any.length === 1 && any[0] ? any[0] : { any };
  }

  private all(): Filter {
    const all = [this.negated()];
    while (this.takeKeyword('AND')) all.push(this.negated());
    return all.length === 1 && all[0] ? all[0] : { all };
  }

  private negated(): Filter {
    let negative = false;
    while (this.takeKeyword('NOT')) negative = !negative;
    const filter = this.takeSign('(') ? this.inBrackets() : this.condition();
    return negative ? { not: filter } : filter;
  }

  private inBrackets(): Filter {
    const filter = this.any();
    if (!this.takeSign(')')) this.refuse('Expected a closing bracket `)`');
    return filter;
  }

  private condition(): Filter {
    const field = this.word('an attribute');
    if (/^_geo/.test(field))
      this.refuse('The local search server knows no places: `_geo…` filters are not supported');
    const token = this.peek();
    if (token?.kind === 'sign' && comparisons.has(token.text)) {
      this.next++;
      return { test: 'compare', field, sign: token.text as Comparison, value: this.word('a value') };
    }
    if (this.takeKeyword('IS')) return this.afterIs(field);
    const negative = this.takeKeyword('NOT');
    const filter = this.afterField(field);
    return negative ? { not: filter } : filter;
  }

  private afterIs(field: string): Filter {
    const negative = this.takeKeyword('NOT');
    const test = this.takeKeyword('NULL') ? 'null' : this.takeKeyword('EMPTY') ? 'empty' : undefined;
    if (!test) this.refuse('Expected `NULL` or `EMPTY` after `IS`');
    return negative ? { not: { test, field } } : { test, field };
  }

  private afterField(field: string): Filter {
    if (this.takeKeyword('EXISTS')) return { test: 'exists', field };
    if (this.takeKeyword('IN')) return { test: 'in', field, values: this.list() };
    if (this.takeKeyword('STARTS')) {
      if (!this.takeKeyword('WITH')) this.refuse('Expected `WITH` after `STARTS`');
      return { test: 'startsWith', field, value: this.word('a value') };
    }
    if (this.takeKeyword('CONTAINS')) this.refuse('`CONTAINS` is not supported by the local search server');
    const after = this.tokens[this.next + 1];
    if (this.peek()?.kind === 'word' && after?.kind === 'word' && !after.quoted && after.text === 'TO') {
      const from = this.word('a value');
      this.next++;
      return { test: 'between', field, from, to: this.word('a value') };
    }
    return this.refuse(
      'Was expecting an operation `=`, `!=`, `>=`, `>`, `<=`, `<`, `IN`, `NOT IN`, `TO`, `EXISTS`, `NOT EXISTS`, ' +
        '`IS NULL`, `IS NOT NULL`, `IS EMPTY`, `IS NOT EMPTY`, `STARTS WITH`, or `NOT STARTS WITH`',
    );
  }

  private list(): string[] {
    const values: string[] = [];
    if (!this.takeSign('[')) this.refuse('Expected `[` after `IN`');
    while (!this.takeSign(']')) {
      values.push(this.word('a value'));
      if (this.takeSign(',')) continue;
      if (!this.takeSign(']')) this.refuse('Expected only comma-separated field names inside `IN[..]`');
      break;
    }
    return values;
  }

  private word(expected: string): string {
    const token = this.peek();
    if (token?.kind !== 'word') return this.refuse(`Was expecting ${expected}`);
    if (!token.quoted && keywords.has(token.text)) {
      this.refuse(`\`${token.text}\` is a keyword: put it in quotes where it stands for ${expected}`);
    }
    this.next++;
    return token.text;
  }

  private peek(): FilterToken | undefined {
    return this.tokens[this.next];
  }

  private takeKeyword(keyword: string): boolean {
    const token = this.peek();
    const here = token?.kind === 'word' && !token.quoted && token.text === keyword;
    if (here) this.next++;
    return here;
  }

  private takeSign(sign: string): boolean {
    const token = this.peek();
    const here = token?.kind === 'sign' && token.text === sign;
    if (here) this.next++;
    return here;
  }

  private refuse(message: string): never {
    const at = this.peek()?.at ?? this.source.length;
    const found = this.source.slice(at, at + 40);
    const where = `${at + 1}:${this.source.length + 1}`;
    throw new FilterSyntaxError(
      `${message}${found === '' ? '' : `, found \`${found}\``} at ${where} of \`${this.source.slice(0, 200)}\`.`,
    );
  }
}
