import type { RejectionReason } from './rejection';

export interface RejectionText {
  sentence: string;
  nextStep: string;
}

/** What is wrong with a file and what to do about it, with the place, the values and the count of one reason. */
export function describeRejection(reason: RejectionReason): RejectionText {
  const { sentence, nextStep } = describeCode(reason);
  const more = reason.count - 1;
  const others = more > 0 && isCounted(reason) ? ` ${more === 1 ? 'One more place has' : `${more} more places have`} the same.` : '';
  return { sentence: `${sentence}${others}`, nextStep };
}

/** Whether the count is of places in the file and not of the names in the sentence. */
function isCounted({ code }: RejectionReason): boolean {
  return code !== 'column-missing';
}

function describeCode(reason: RejectionReason): RejectionText {
  const found = reason.found ?? 'nothing';
  const expected = reason.expected ?? 'something else';
  const place = describePlace(reason);
  const text = (sentence: string, nextStep: string): RejectionText => ({ sentence, nextStep });
  switch (reason.code) {
    case 'empty-file':
      return text(`The file is empty: ${found}.`, 'Check that the solver had finished writing, and upload the file again.');
    case 'unsupported-format':
      return text(`The file is ${found}, which is not read.`, `Write ${expected}.`);
    case 'binary-content':
      return text(`The file is not text: it contains ${found}.`, `Write ${expected}.`);
    case 'damaged-gzip':
      return text(`The compressed file cannot be unpacked: ${found}.`, 'Test it with gzip -t, compress it anew, and upload it again.');
    case 'damaged-file':
      return text(`The file cannot be read: ${found}; expected ${expected}.`, 'It may have been cut off while it was written or copied. Open it where it was written, and upload it again.');
    case 'expands-too-far':
      return text(`The compressed file expands to ${found}; expected ${expected}.`, 'Check that it holds one table of numbers, and upload it uncompressed or in a smaller form.');
    case 'too-many-columns':
      return text(`The file has ${found}; expected ${expected}.`, 'Write one column per coordinate, weight and field, with the rows below each other.');
    case 'too-much-computing':
      return text(`Computing was given up ${found}; expected ${expected}.`, 'Simplify the exact solution of the problem, whose expressions are computed at every row, or upload a smaller file.');
    case 'too-much-memory':
      return text(`The file needs ${found} to be read; expected ${expected}.`, 'Write it as a text table with one row per line, which is read piece by piece.');
    case 'checksum-differs':
      return text(`The stored bytes differ from the file that was sent: their SHA-256 is ${found}, that of the file ${expected}.`, 'Send the file again.');
    case 'malformed-json':
      return text(`${place}: found ${found} where the JSON should have ${expected}.`, 'Write the file with a JSON library, or as a text table.');
    case 'malformed-vtk':
      return text(`${place}: found ${found}; a VTK file should have ${expected}.`, 'Write the file with a VTK library, or as a text table. If it may have been cut off while it was copied, upload it again.');
    case 'mixed-rows':
      return text(`The columns cannot be read together: ${found}; expected ${expected}.`, 'Map columns of one kind. Volumes are those of cells: with columns of points, map a weight of points or state equal weights.');
    case 'unsupported-cell':
      return text(`The file has a ${found}; volumes and centres are computed for ${expected}.`, 'Write values at points, with weights of their own, or linear cells.');
    case 'mixed-cells':
      return text(`The file has a ${found}; expected ${expected}, since a length and an area do not add up.`, 'Leave out cells of the boundary, or map a weight of your own.');
    case 'line-too-long':
      return text(`${place}: ${found}.`, 'Write one row per line.');
    case 'too-many-values':
      return text(`The file holds ${found} in the columns that are read.`, `Write ${expected}.`);
    case 'column-missing':
      return text(`${place}: ${reason.count === 1 ? 'the column' : 'the columns'} ${expected} ${reason.count === 1 ? 'is' : 'are'} not in the file. Found: ${found}.`,
        'Name the column in the file, or change the mapping of the case.');
    case 'column-type':
      return text(`${place}: a column that is needed holds no numbers that are read. Found ${found}; expected ${expected}.`, 'Write the column as numbers, or change the mapping of the case.');
    case 'duplicate-column':
      return text(`${place}: expected ${expected}, found several in ${found}.`, 'Give every column a name of its own, or map the full path.');
    case 'too-few-rows':
      return text(`The file has ${found}; expected ${expected}.`, 'Check that the solver wrote its values.');
    case 'short-row':
      return text(`${place}: the row has ${found}; the file has ${expected}.`, 'The file may have been cut off while it was copied. Upload it again, or write the missing values.');
    case 'long-row':
      return text(`${place}: the row has ${found}; the file has ${expected}.`, 'Name every column in the header, remove what is extra, or say in the columns of the case what parts them.');
    case 'column-length':
      return text(`${place}: the column has ${found}; expected ${expected}.`, 'Give every column one value per row.');
    case 'missing-value':
      return text(`${place}: found ${found}; expected ${expected}.`, 'Write a value in every row of the columns that are read.');
    case 'not-a-number':
      return text(`${place}: found “${found}”; expected ${expected}.`, 'Correct the value, or leave the row out when it is not part of the solution.');
    case 'not-finite':
      return text(`${place}: found ${found}; expected ${expected}.`, 'The run has diverged or divided by zero there. Mend the run, and upload its file again.');
    case 'mixed-decimal':
      return text(`${place}: found “${found}”; expected ${expected}. With both marks in one file a number can be read in two ways.`, 'Write all numbers with one decimal mark, or say in the columns of the case which it is.');
    case 'weight-not-positive':
      return text(`${place}: the weight is ${found}; expected ${expected}.`, 'Map the column that holds cell volumes or quadrature weights, or state equal weights. Lumped weights of quadratic elements, made of row sums, are zero or negative at some nodes: write rows at quadrature points instead.');
    case 'time-differs':
      return text(`${place}: the time is ${found}; expected ${expected}.`, 'Correct the time of the grid, or upload the file that was written at it.');
    case 'points-differ':
      return text(`${place}: found ${found}; expected ${expected}.`, 'Write the solutions of all grids at the same points, in the same order.');
    case 'exact-not-finite':
      return text(`${place}: the exact solution is ${found}; expected ${expected}.`, 'Check the expression of the problem, its constants and the time of the grid.');
  }
}

function describePlace({ line, column }: RejectionReason): string {
  if (line !== null) return column === null ? `Line ${line}` : `Line ${line}, column ${column}`;
  return column === null ? 'The file' : `Column ${column}`;
}
