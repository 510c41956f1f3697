/**
 * Display formulas: parsed by jsep, evaluated in tests against the code, and written out symbolically and with numbers put in.
 * Grammar: + - * / ^ ( ), names, numbers, pi, and the functions sqrt, sin, ln, exp, min, max.
 */
import { formatNumber } from './format.js';
import { exp, ln, sinOfAcute } from './numeric/elementary.js';
import jsep from 'jsep';
import { power } from './numeric/power.js';

jsep.removeBinaryOp('^');
jsep.addBinaryOp('^', 11, true);

const FUNCTIONS: Readonly<Record<string, (...values: number[]) => number>> = {
  sqrt: Math.sqrt,
  sin: sinOfAcute,
  ln,
  exp,
  min: Math.min,
  max: Math.max,
};

type Node = jsep.Expression;

/** Parses a display formula. @throws Error where it is not of the grammar. */
export function parseExpression(text: string): Node {
  return jsep(text);
}

/** Value of a parsed formula with `values` for its names. @throws Error for a name without a value or an unknown function. */
export function evaluateExpression(node: Node, values: Readonly<Record<string, number>>): number {
  switch (node.type) {
    case 'Literal':
      return Number((node as jsep.Literal).value);
    case 'Identifier': {
      const { name } = node as jsep.Identifier;
      if (name === 'pi') return Math.PI;
      const value = values[name];
      if (value === undefined) throw new Error(`no value for ${name}`);
      return value;
    }
    case 'UnaryExpression': {
      const { operator, argument } = node as jsep.UnaryExpression;
      const value = evaluateExpression(argument, values);
      return operator === '-' ? -value : value;
    }
    case 'BinaryExpression': {
      const { operator, left, right } = node as jsep.BinaryExpression;
      const a = evaluateExpression(left, values);
      const b = evaluateExpression(right, values);
      if (operator === '+') return a + b;
      if (operator === '-') return a - b;
      if (operator === '*') return a * b;
      if (operator === '/') return a / b;
      if (operator === '^') return power(a, b);
      throw new Error(`unknown operator ${operator}`);
    }
    case 'CallExpression': {
      const call = node as jsep.CallExpression;
      const name = (call.callee as jsep.Identifier).name;
      const f = FUNCTIONS[name];
      if (f === undefined) throw new Error(`unknown function ${name}`);
      return f(...call.arguments.map((argument) => evaluateExpression(argument, values)));
    }
    default:
      throw new Error(`not a formula: ${node.type}`);
  }
}

/** Longer than any constant is printed. */
const LONGEST_LITERAL = 9;
const STRENGTH: Readonly<Record<string, number>> = { '+': 1, '-': 1, '*': 2, '/': 2, '^': 3 };
const SIGN: Readonly<Record<string, string>> = { '*': ' × ', '/': ' / ', '+': ' + ', '-': ' − ', '^': '^' };

/** The formula as text, each name written by `nameOf` (its symbol, or its value). */
export function writeExpression(node: Node, nameOf: (name: string) => string): string {
  return write(node, nameOf).text;
}

function write(node: Node, nameOf: (name: string) => string): { text: string; strength: number } {
  if (node.type === 'Literal') {
    const { raw } = node as jsep.Literal;
    // an ordinate of a table that was computed has all its digits
    return { text: raw.length > LONGEST_LITERAL ? formatNumber(Number(raw), 4) : raw, strength: 9 };
  }
  if (node.type === 'Identifier') {
    const { name } = node as jsep.Identifier;
    return { text: name === 'pi' ? 'π' : nameOf(name), strength: 9 };
  }
  if (node.type === 'UnaryExpression') {
    return { text: `−${write((node as jsep.UnaryExpression).argument, nameOf).text}`, strength: 1 };
  }
  if (node.type === 'CallExpression') {
    const call = node as jsep.CallExpression;
    const name = (call.callee as jsep.Identifier).name;
    const inner = call.arguments.map((argument) => write(argument, nameOf).text).join('; ');
    return { text: name === 'sqrt' ? `√(${inner})` : `${name}(${inner})`, strength: 9 };
  }
  const { operator, left, right } = node as jsep.BinaryExpression;
  const strength = STRENGTH[operator] ?? 0;
  const a = write(left, nameOf);
  const b = write(right, nameOf);
  const lower = a.strength < strength || (operator === '^' && a.strength < 9);
  const bare = operator === '+' || operator === '*' ? b.strength < strength : b.strength <= strength;
  return {
    text: `${lower ? `(${a.text})` : a.text}${SIGN[operator] ?? operator}${bare ? `(${b.text})` : b.text}`,
    strength,
  };
}
