import { dirname, join, relative, sep } from 'node:path';

/** What each folder of the project may import from; arrows only point inward. Folders that are not named may do as they like. */
const allowed = {
  shared: ['shared'],
  server: ['server', 'shared'],
  seeds: ['seeds', 'server', 'shared'],
  migrations: ['migrations'],
  src: ['src', 'shared'],
};

/** What runs on both sides cannot lean on what only one of them has. */
const oneSided = /^(?:node:|@angular\/|express$|express-|knex$|mysql2|meilisearch$|nodemailer$|rxjs)/;

/** @type {import('eslint').Rule.RuleModule} */
export const importDirections = {
  meta: {
    type: 'problem',
    docs: {
      description: 'Imports only point inward, and a feature asks the service of another one, not its store.',
    },
    messages: {
      outward: 'Files of {{from}}/ import from {{allowed}} only, not from {{to}}/.',
      oneSided: '{{source}} exists on one side only; what is shared runs on both.',
      store: "The store of {{to}} is its own: ask {{to}}'s service.",
    },
    schema: [],
  },
  create(context) {
    const file = relative(context.cwd, context.filename).split(sep);
    const check = (node) => {
      const source = node.source?.value;
      if (typeof source !== 'string') return;
      const report = (messageId, data) => context.report({ node: node.source, messageId, data });
      if (!source.startsWith('.')) {
        if (file[0] === 'shared' && !isSpec(file) && oneSided.test(source)) report('oneSided', { source });
        return;
      }
      const target = relative(context.cwd, join(dirname(context.filename), source)).split(sep);
      const zones = zonesOf(file);
      if (zones && !zones.includes(target[0]))
        report('outward', {
          from: file[0],
          to: target[0],
          allowed: zones.map((zone) => `${zone}/`).join(', '),
        });
      else if (isForeignStore(file, target)) report('store', { to: target[1] });
    };
    return {
      ImportDeclaration: check,
      ExportNamedDeclaration: check,
      ExportAllDeclaration: check,
      ImportExpression: check,
    };
  },
};

function zonesOf(file) {
  const zones = allowed[file[0]];
  // What stands in for hosted parts also fills an empty database with the demo.
  return zones && file[0] === 'server' && file[1] === 'local' ? [...zones, 'seeds'] : zones;
}

function isForeignStore(file, target) {
  const bothInFeatures =
    file[0] === 'server' && target[0] === 'server' && file.length > 2 && target.length > 2;
  return bothInFeatures && !isSpec(file) && file[1] !== target[1] && /\.store(?:\.js)?$/.test(target.at(-1));
}

function isSpec(file) {
  return file.at(-1).endsWith('.spec.ts');
}
