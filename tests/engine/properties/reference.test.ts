import { describe, expect, it } from 'vitest';
import { readCsv } from '../../../src-server/commands/reference/csv';
import { compareProperties } from '../../../src-server/commands/reference/properties';

const head = 'substance,property,T_K,p_Pa,inputs,expected,rel_tol,reference,kind,id';

describe('comparison with a table of check values', () => {
  it('counts what agrees, names what does not, and skips only what is not carried', () => {
    const summary = compareProperties(
      [
        head,
        // R7-97, table 5.
        'water,h,300,3000000,,115331.273,1e-8,R7-97 table 5,a,right',
        'water,h,300,3000000,,115332,1e-8,,a,wrong',
        'water,rho,5000,3000000,,1,1e-8,,a,refused',
        'unobtainium,k,300,,,1,1e-3,,a,unknown',
        'water,colour,300,1e5,,1,1e-3,,a,no-property',
        'R32,mu,300,1e5,,1,1e-3,,a,no-equation',
        'water,rho,300,,"{""eos"":""IAPWS-95"",""rho"":1000}",1,1e-3,,a,other-formulation',
      ].join('\n'),
    );
    expect([summary.passed, summary.failed, summary.skipped]).toEqual([1, 2, 4]);
    expect(summary.lines[0]).toMatch(/^row 3 wrong water h: got 115331\.27\d+, expected 115332 within 1e-8$/);
    expect(summary.lines[1]).toContain('row 4 refused water rho: got 4726.85 °C is outside IAPWS R7-97');
    expect(summary.lines).toContain('skipped 1: unobtainium is not carried');
    expect(summary.lines).toContain('skipped 1: mu of R32 is not carried');
  });

  it('compares with zero absolutely', () => {
    const row = 'air,delta_h,,100000,"{""T1"":300,""T2"":300}",0,1e-9,,a,zero';
    expect(compareProperties(`${head}\n${row}`).passed).toBe(1);
  });
});

describe('records of a CSV', () => {
  it('reads quoted cells with commas, quotes and line ends (RFC 4180)', () => {
    expect(readCsv('a,b\r\n"x, ""y""\nz",2\r\n')).toEqual([{ a: 'x, "y"\nz', b: '2' }]);
  });

  it('says where a row has another number of cells', () => {
    expect(() => readCsv('a,b\n1,2\n1\n')).toThrow('row 3 has 1 cells, the header 2');
  });
});
