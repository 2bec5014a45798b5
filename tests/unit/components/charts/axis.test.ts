import { describe, expect, test } from 'vitest';
import { chooseDomain, layAxis, plainNumber, threeDigits } from '@/components/charts/axis';

describe('numbers as they are written', () => {
  test.each([
    [0, '0'],
    [0.4567, '0.457'],
    [4.5, '4.50'],
    [78, '78.0'],
    [1234, '1230'],
    [-0.31, '−0.310'],
  ])('%d with three digits is %s', (value, text) => {
    expect(threeDigits(value)).toBe(text);
  });

  test('a value that rounds to nothing has no minus sign', () => {
    expect(plainNumber(-0.001, 1)).toBe('0.0');
  });
});

describe('the stretch of values that a plot shows', () => {
  test('holds a claim that lies near', () => {
    const [low, high] = chooseDomain([71, 78, 86], { lower: 60, upper: 75, label: '' });
    expect(low).toBeLessThanOrEqual(60);
    expect(high).toBeGreaterThan(86);
  });

  test('does not follow a claim that lies far off', () => {
    const [, high] = chooseDomain([71, 78, 86], { lower: 400, upper: 450, label: '' });
    expect(high).toBeLessThan(110);
  });

  test('does not blow a small scatter up to the whole width', () => {
    const [low, high] = chooseDomain([99.9, 100.1]);
    expect(high - low).toBeGreaterThanOrEqual(35);
  });

  test('begins at zero where it would begin close to it, and never below for what is not negative', () => {
    expect(chooseDomain([0.1, 1, 3])[0]).toBe(0);
    expect(chooseDomain([0, 0])).toEqual([0, 0.5]);
    expect(chooseDomain([-5, 5])[0]).toBeLessThan(-5);
  });
});

test('a scale given by the page is kept, so that several plots stand on the same one', () => {
  const axis = layAxis({ domain: [13, 97], fixed: true, unit: 'W', width: 350, stone: 20 });
  expect(axis.domain).toEqual([13, 97]);
  expect(axis.ticks.map((tick) => tick.label)).toEqual(['20', '40', '60', '80']);
});

test('the places of an axis follow its step', () => {
  const axis = layAxis({ domain: [0.6, 1.1], fixed: true, unit: 'kWh/d', width: 350, stone: 20 });
  expect(axis.ticks.map((tick) => tick.label)).toEqual(['0.6', '0.7', '0.8', '0.9', '1.0', '1.1']);
});
