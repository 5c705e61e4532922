import { resetPasswordSchema, signUpSchema } from './accounts-contract.js';

const signUp = {
  name: 'Ines Okafor',
  email: 'ines@example.com',
  password: 'a long enough one',
  shopName: 'Test shop',
  timeZone: 'America/Chicago',
  unitSystem: 'inch',
};

describe('sign-up', () => {
  it('takes a shop and its owner', () => {
    expect(signUpSchema.safeParse(signUp).success).toBe(true);
  });

  it('keeps a password as it was typed, spaces included', () => {
    expect(signUpSchema.parse({ ...signUp, password: '  twelve chars  ' }).password).toBe('  twelve chars  ');
  });

  it.each([
    ['password', 'elevenchars', 'Use at least 12 characters.'],
    ['password', 'x'.repeat(129), 'Use at most 128 characters.'],
    ['timeZone', 'Mars/Olympus', 'Choose a time zone from the list.'],
    ['unitSystem', 'cubit', 'Choose inch or metric.'],
    ['shopName', ' ', "The shop's name cannot be empty."],
    ['email', 'ines', 'This is not an e-mail address.'],
  ])('refuses as %s: %j', (field, value, message) => {
    const result = signUpSchema.safeParse({ ...signUp, [field]: value });
    expect(result.error?.issues.map((issue) => [issue.path[0], issue.message])).toEqual([[field, message]]);
  });

  it('refuses a role, an id or any other key that nobody asked for', () => {
    expect(signUpSchema.safeParse({ ...signUp, role: 'owner' }).success).toBe(false);
  });
});

it('a link that was cut short is not taken for a token', () => {
  expect(resetPasswordSchema.safeParse({ token: 'abc', password: 'a long enough one' }).success).toBe(false);
});
