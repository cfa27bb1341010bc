import { newPart, partFields, partForm } from './part-form';

describe('the form of a part', () => {
  it('keeps what a motor’s plate says and leaves out what it does not', () => {
    const form = partForm('motor', { nameplate: { volts: 115, amps: 6.8 } });
    expect(partFields(form).nameplate).toEqual({ volts: 115, amps: 6.8 });
  });

  it('sends no nameplate with a pump and no face with a motor', () => {
    const part = { pumpFace: 'gasket' as const, nameplate: { volts: 115 } };
    expect(newPart('a', partForm('pump', part))).toMatchObject({
      kind: 'pump',
      pumpFace: 'gasket',
      nameplate: {},
    });
    expect(partFields(partForm('motor', part)).pumpFace).toBeNull();
  });

  it('asks for the day of fitting and refuses a figure of zero', () => {
    const form = partForm('motor', { nameplate: { amps: 0 } });
    expect(form.controls.installedOn.valid).toBe(false);
    expect(form.controls.nameplate.controls.amps.valid).toBe(false);
  });
});
