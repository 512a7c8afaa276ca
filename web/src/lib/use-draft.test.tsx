import { act, renderHook } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { useDraft } from './use-draft';

describe('useDraft', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it('keeps a change on this device within two seconds and brings it back', () => {
    const first = renderHook(() => useDraft('form', { name: '' }));
    act(() => first.result.current.set({ name: 'Long' }));
    act(() => vi.advanceTimersByTime(2000));
    expect(first.result.current.savedAt).not.toBeNull();
    const second = renderHook(() => useDraft('form', { name: '' }));
    expect(second.result.current).toMatchObject({ value: { name: 'Long' }, restored: true });
  });

  it('writes at once when the page is left in the middle of typing', () => {
    const form = renderHook(() => useDraft('form', { name: '' }));
    act(() => form.result.current.set({ name: 'Lo' }));
    form.unmount();
    expect(localStorage.getItem('furrowlight-draft:form')).toContain('"Lo"');
  });

  it('forgets the draft after a save', () => {
    const form = renderHook(() => useDraft('form', { name: '' }));
    act(() => form.result.current.set({ name: 'Long' }));
    act(() => vi.advanceTimersByTime(2000));
    act(() => form.result.current.clear({ name: 'Long' }));
    expect(localStorage.getItem('furrowlight-draft:form')).toBeNull();
    expect(form.result.current.savedAt).toBeNull();
  });

  it('shrugs off a stored draft that cannot be read', () => {
    localStorage.setItem('furrowlight-draft:form', '{"at":');
    const form = renderHook(() => useDraft('form', { name: 'saved' }));
    expect(form.result.current).toMatchObject({ value: { name: 'saved' }, restored: false });
  });
});
