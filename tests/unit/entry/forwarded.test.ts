import { describe, expect, it } from 'vitest';
import { keepTrusted } from '@/entry/http/forwarded';

const sent = () => ({
  host: 'plan.example',
  'x-forwarded-for': '198.51.100.1, 203.0.113.9',
  'x-forwarded-proto': 'https',
  'x-forwarded-host': 'elsewhere.example',
  forwarded: 'for=198.51.100.1',
});

describe('headers about the way of a request', () => {
  it('are all dropped without a proxy', () => {
    const headers = sent();
    keepTrusted(headers, false);
    expect(headers).toEqual({ host: 'plan.example' });
  });

  it('keep only what the proxy itself added, the last address', () => {
    const headers = sent();
    keepTrusted(headers, true);
    expect(headers).toEqual({ host: 'plan.example', 'x-forwarded-for': '203.0.113.9', 'x-forwarded-proto': 'https' });
  });
});
