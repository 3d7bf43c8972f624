import type { Table } from '../../rules/worksheets/result.ts'

/** A table of an answer; on a phone each row lists its cells with their heads. */
export function ResultTable({ table }: { table: Table }) {
  return (
    <div className="ws-table">
      <table>
        <caption>{table.title}</caption>
        <thead>
          <tr>
            {table.head.map((head) => (
              <th key={head} scope="col">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row, i) => (
            <tr key={i} className={i === table.chosen ? 'ws-chosen' : ''}>
              {row.map((cell, j) =>
                j === 0 ? (
                  <th key={j} scope="row" data-head={table.head[j]}>
                    {cell}
                    {i === table.chosen && <small> (this sheet)</small>}
                  </th>
                ) : (
                  <td key={j} data-head={table.head[j]}>
                    {cell}
                  </td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
