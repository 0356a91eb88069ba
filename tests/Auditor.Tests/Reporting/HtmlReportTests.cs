namespace Auditor.Tests.Reporting;

public sealed class HtmlReportTests
{
    [Fact]
    public void The_sample_page_is_the_golden_one() => Golden.Matches(Pages.Render(SampleRecords.Full), "sample.html");
}
