using System.Globalization;
using System.Text;

namespace Auditor.Tests.Design;

public sealed class ModelBinderTests
{
    [Fact]
    public void Terms_that_make_too_many_columns_are_refused_with_the_widest_named()
    {
        var data = new StringBuilder("y,x,dealer\n");
        for (var i = 0; i < 5_100; i++)
        {
            data.Append(CultureInfo.InvariantCulture, $"{i % 7},{i % 11},d{i}\n");
        }

        var reading = AuditRunner.Try(
            "audit: 1\nmodel: {id: wide}\ndata: {source: data.csv}\nresponse: y\nfinal_model: {terms: [x]}\nleft_out:\n  - {group: dealer, terms: [dealer]}\n",
            _ => new MemoryStream(Encoding.UTF8.GetBytes(data.ToString())));

        Assert.Equal(
            ["declaration.yaml:7: the terms make 5,100 columns, more than the 5,000 that can be audited at once; the widest, dealer, makes 5,099"],
            reading.Problems.Select(problem => problem.ToString()));
    }

    [Theory]
    [InlineData("region", "response: region must be one number, found levels")]
    [InlineData("{log: region}", "log(region)")]
    public void A_response_that_is_no_number_is_refused(string response, string words)
    {
        var reading = AuditRunner.Try(
            $"audit: 1\nmodel: {{id: odd}}\ndata: {{source: data.csv}}\nresponse: {response}\nfinal_model: {{terms: [x]}}\nleft_out: []\n",
            _ => new MemoryStream(Encoding.UTF8.GetBytes("region,x\nnorth,1\nsouth,2\nnorth,3\n")));

        Assert.Contains(words, Assert.Single(reading.Problems).ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Weights_that_cannot_be_weights_are_listed_row_by_row()
    {
        var reading = AuditRunner.Try(
            "audit: 1\nmodel: {id: w}\ndata: {source: data.csv, weights: {column: w, kind: frequency}}\nresponse: y\nfinal_model: {terms: [x]}\nleft_out: []\n",
            _ => new MemoryStream(Encoding.UTF8.GetBytes("y,x,w\n1,2,-1\n2,3,1.5\n3,5,\n4,4,2\n")));

        Assert.Equal(
            [
                "declaration.yaml:3: weights: column w, row 1: the weight is negative",
                "declaration.yaml:3: weights: column w, row 2: a frequency must be a whole number",
                "declaration.yaml:3: weights: column w, row 3: the weight is missing; give one, or take the row out with data.keep",
            ],
            reading.Problems.Select(problem => problem.ToString()));
    }
}
