const { readFileSync } = require('node:fs');
const { join } = require('node:path');

const swc = JSON.parse(readFileSync(join(__dirname, '.swcrc'), 'utf8'));
delete swc.$schema;
const libs = 'sky|elements|darkness|nights|catalogue|charts|print|calendar|club';

/** @type {import('jest').Config} */
module.exports = {
  rootDir: __dirname,
  testMatch: [
    '<rootDir>/libs/**/*.spec.ts',
    '<rootDir>/apps/**/*.spec.ts',
    '<rootDir>/demo-data/**/*.spec.ts',
    '<rootDir>/test/**/*.spec.ts',
  ],
  transform: {
    '^.+\\.ts$': ['@swc/jest', { ...swc, module: { type: 'commonjs' }, swcrc: false }],
    '^.+\\.m?js$': ['@swc/jest', { jsc: { target: 'es2022' }, module: { type: 'commonjs' }, swcrc: false }],
  },
  // ical.js ships only ES modules; Node loads them through require() from 20.19,
  // but Jest needs them turned into CommonJS.
  transformIgnorePatterns: ['/node_modules/(?!ical\\.js/)'],
  moduleNameMapper: {
    [`^#(${libs})$`]: '<rootDir>/libs/$1/index.ts',
    '^#club/sky$': '<rootDir>/libs/club/sky/index.ts',
    '^#demo-data$': '<rootDir>/demo-data/index.ts',
  },
  modulePathIgnorePatterns: ['<rootDir>/dist/'],
  testEnvironment: 'node',
  // Room for a busy machine: workers start and databases are made in many tests.
  testTimeout: 60_000,
};
