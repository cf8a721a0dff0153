import { fireEvent, screen } from '@testing-library/react';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { renderPart } from '../testing/render.tsx';
import { Button } from './button.tsx';
import { Checkbox } from './checkbox.tsx';
import { Form } from './form.tsx';
import { NumberField } from './number-field.tsx';
import { RadioGroup } from './radio-group.tsx';
import { Select } from './select.tsx';
import { TextArea, TextField } from './text-field.tsx';

const messages = {
  title: 'Write a title',
  question: 'Write a question',
  months: 'Choose 1 to 36 months',
  outcome: 'Choose an outcome',
  interest: 'Say whether there is an interest',
  terms: 'Accept the terms',
};

/** Every kind of field, all wrong once sent. */
function Everything({ onSubmit }: { readonly onSubmit: () => void }) {
  const [sent, setSent] = useState(0);
  const [title, setTitle] = useState('');
  const error = (id: keyof typeof messages) => (sent > 0 ? messages[id] : undefined);
  return (
    <Form
      attempt={sent}
      problems={sent === 0 ? [] : Object.entries(messages).map(([fieldId, message]) => ({ fieldId, message }))}
      onSubmit={() => {
        setSent(sent + 1);
        onSubmit();
      }}
    >
      <TextField
        id="title"
        label="Title"
        hint="At most 150 characters"
        isRequired
        value={title}
        onChange={setTitle}
        error={error('title')}
      />
      <TextArea id="question" label="Question" value="why" maxLength={20} onChange={() => undefined} error={error('question')} />
      <NumberField id="months" label="Duration" unit="months" value={null} onChange={() => undefined} error={error('months')} />
      <Select
        id="outcome"
        label="Outcome"
        value={null}
        onChange={() => undefined}
        options={[{ value: 'a', label: 'Gait speed' }]}
        error={error('outcome')}
      />
      <RadioGroup
        id="interest"
        label="Commercial interest"
        value={null}
        onChange={() => undefined}
        options={[{ value: 'no', label: 'No' }]}
        error={error('interest')}
      />
      <Checkbox id="terms" value={false} onChange={() => undefined} error={error('terms')}>
        I accept the terms
      </Checkbox>
      <Button type="submit">Send</Button>
    </Form>
  );
}

describe('a form', () => {
  it('names every problem twice in the same words, takes the focus to the list, and each link leads to its field', () => {
    const onSubmit = vi.fn();
    renderPart(<Everything onSubmit={onSubmit} />);
    expect(screen.queryByRole('alert')).toBeNull();
    fireEvent.submit(screen.getByRole('textbox', { name: /Title/ }));
    expect(onSubmit).toHaveBeenCalledTimes(1);

    const summary = screen.getByRole('alert', { name: '6 things need mending' });
    expect(document.activeElement).toBe(summary);
    for (const [id, message] of Object.entries(messages)) {
      expect(screen.getAllByText(message)).toHaveLength(2);
      fireEvent.click(screen.getByRole('link', { name: message }));
      const field = document.getElementById(id);
      expect(field === document.activeElement || field?.contains(document.activeElement) === true).toBe(true);
      expect(document.activeElement).not.toBe(document.body);
    }
  });

  it('comes back to the list when a second try fails as the first did', () => {
    renderPart(<Everything onSubmit={() => undefined} />);
    const title = screen.getByRole('textbox', { name: /Title/ });
    fireEvent.submit(title);
    title.focus();
    fireEvent.submit(title);
    expect(document.activeElement).toBe(screen.getByRole('alert'));
  });

  it('ties hint and error to the field for those who hear it, and marks what is required', () => {
    renderPart(<Everything onSubmit={() => undefined} />);
    fireEvent.submit(screen.getByRole('textbox', { name: /Title/ }));
    const title = screen.getByRole('textbox', { name: 'Title (required)' });
    const described = (title.getAttribute('aria-describedby') ?? '').split(' ').map((id) => document.getElementById(id)?.textContent);
    expect(described).toContain('Write a title');
    expect(described).toContain('At most 150 characters');
    expect(title.getAttribute('aria-invalid')).toBe('true');
  });

  it('tells how much room is left in a long field', () => {
    renderPart(<Everything onSubmit={() => undefined} />);
    expect(screen.getByText('3 of 20 characters')).toBeTruthy();
  });
});
