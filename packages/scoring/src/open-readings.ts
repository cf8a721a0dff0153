/** A point where the standard can be read in more than one way, or says nothing, and what is done here. */
export interface OpenReading {
  readonly question: string;
  readonly choice: string;
  readonly why: string;
}

/** For the page that states the methods. Each choice is pinned by a test. */
export const openReadings: readonly OpenReading[] = [
  {
    question: 'Where is the motor level when all key muscles of the arms are normal but sensation is altered between C5 and T1?',
    choice: 'At T1: the motor level follows the sensory level only in segments without a key muscle.',
    why: 'Two readings are published and differ in about 2% of motor levels, never in the grade (Schuld et al., Top Spinal Cord Inj Rehabil 2025;31(3):37-47).',
  },
  {
    question: 'What is the level of injury when every score is normal but voluntary anal contraction is absent?',
    choice: 'S3, with a warning to check the entry.',
    why: 'Intact needs contraction; S3 is the lowest level there is.',
  },
  {
    question: 'Is a motor incomplete injury C or D when no key muscle lies below its level (S1 to S3)?',
    choice: 'D.',
    why: 'Half or more of the key muscles below the level must reach grade 3, and of none, none fails to.',
  },
  {
    question: 'When does a non-key muscle extend the motor zone of partial preservation?',
    choice:
      "Only when the grade is C, and only when it lies more than three levels below that side's motor level. In A and D it is ignored.",
    why: 'There the entry counts towards the grade; elsewhere the zone is one of key muscles.',
  },
  {
    question: 'Does absent deep anal pressure rule out E when S4-5 is normal to touch and pin prick?',
    choice: 'No, but it raises a warning.',
    why: 'Completeness and grade need only one sign of preservation at S4-5.',
  },
  {
    question: 'Which grade has a normal exam of a person without an earlier deficit on record?',
    choice: 'None.',
    why: 'E says that a deficit has gone.',
  },
];
