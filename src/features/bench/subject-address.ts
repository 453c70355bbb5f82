/** Where a history line's subject is shown. */
export function addressOfSubject(commissionId: string, subject: string, subjectId: string): string {
  const base = `/commissions/${commissionId}`;
  switch (subject) {
    case 'report':
      return `${base}/reports/${subjectId}`;
    case 'joint':
      return `${base}/joints/${subjectId}`;
    case 'handoff':
      return `${base}/handoffs/${subjectId}`;
    case 'leg':
    case 'part':
      return `${base}/plan`;
    case 'parties':
      return `${base}/parties`;
    default:
      return base;
  }
}
