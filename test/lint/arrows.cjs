// The lint rule behind the import directions of DEVELOPERS.md: which part may import which.
const { dirname, join, relative, resolve, sep } = require('node:path');

const root = join(__dirname, '..', '..');

/** What each part may import from the project besides itself. */
const allowed = {
  'libs/sky': [],
  'libs/elements': ['libs/sky'],
  'libs/darkness': ['libs/sky'],
  'libs/nights': ['libs/sky', 'libs/darkness'],
  'libs/catalogue': ['libs/sky'],
  'libs/charts': ['libs/sky', 'libs/catalogue'],
  'libs/print': ['libs/charts', 'libs/nights'],
  'libs/calendar': [],
  'libs/club': [
    'libs/sky',
    'libs/elements',
    'libs/darkness',
    'libs/nights',
    'libs/catalogue',
    'libs/charts',
    'libs/print',
    'libs/calendar',
  ],
  'demo-data': ['libs/sky', 'libs/elements', 'libs/club'],
  'apps/server': ['libs/*', 'demo-data'],
  'apps/cli': ['libs/*', 'demo-data'],
  'apps/web': [],
};

/** Packages that only the outer parts may use: frameworks, the database, files and the network. */
const outerPackages =
  /^(@nestjs\/|nestjs-|@prisma\/|prisma$|better-sqlite3$|(node:)?(http|https|net|child_process|worker_threads)$)/;
const filePackages = /^(node:)?fs(\/|$)/;
const outerParts = /^(libs\/club|apps\/|demo-data|test)/;
/** Libraries that load data files of their own, and the only ones that may touch files. */
const loadsOwnFiles = /^libs\/(catalogue|charts|print)$/;

/** Says why `file` (relative to the root) may not import `source`, or null where it may. */
function forbiddenImport(file, source) {
  const from = partOf(file);
  if (from === null || from.startsWith('test') || /\.spec\.ts$/.test(file)) return null;
  if (outerPackages.test(source) && !outerParts.test(from)) {
    return `${from} computes and stays free of frameworks, databases and the network; it may not import "${source}".`;
  }
  if (filePackages.test(source) && !outerParts.test(from) && !loadsOwnFiles.test(from)) {
    return `${from} has no data files of its own and may not import "${source}".`;
  }
  const to = targetOf(file, source);
  if (to === null || to === from) {
    return null;
  }
  if (source.startsWith('.') && to.startsWith('libs/')) {
    return `import ${to} by its public name "#${to.slice('libs/'.length)}", not by a path into it.`;
  }
  const may = allowed[from] ?? [];
  if (may.includes(to) || may.includes(`${to.split('/')[0]}/*`)) return null;
  return `${from} may not import ${to}; it may import ${may.join(', ') || 'general libraries only'}.`;
}

function partOf(file) {
  const steps = file.split(/[\\/]/);
  if (steps[0] === 'demo-data' || steps[0] === 'test') return steps[0];
  return (steps[0] === 'libs' || steps[0] === 'apps') && steps.length > 2 ? `${steps[0]}/${steps[1]}` : null;
}

function targetOf(file, source) {
  if (source === '#demo-data') return 'demo-data';
  // '#club/sky' is a second door of the same part.
  if (source.startsWith('#')) return `libs/${source.slice(1).split('/')[0]}`;
  if (!source.startsWith('.')) return null;
  const target = relative(root, resolve(root, dirname(file), source))
    .split(sep)
    .join('/');
  return partOf(`${target}/x`);
}

const arrows = {
  meta: { type: 'problem', schema: [], messages: { forbidden: '{{why}}' } },
  create(context) {
    const file = relative(root, context.filename).split(sep).join('/');
    const check = (node) => {
      if (typeof node.source?.value !== 'string') return;
      const why = forbiddenImport(file, node.source.value);
      if (why !== null) context.report({ node, messageId: 'forbidden', data: { why } });
    };
    return {
      ImportDeclaration: check,
      ImportExpression: check,
      ExportNamedDeclaration: check,
      ExportAllDeclaration: check,
    };
  },
};

module.exports = { allowed, arrows, forbiddenImport };
